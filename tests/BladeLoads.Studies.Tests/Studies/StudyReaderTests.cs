using BladeLoads.Rotor.Operation;

namespace BladeLoads.Studies.Tests.Studies;

public class StudyReaderTests
{
    [Fact]
    public void A_sound_study_is_read_whole()
    {
        var study = new FellStudy().With("polars/clean/tip.csv", FellStudy.RootPolar).Read();

        Assert.Empty(study.Errors);
        Assert.Empty(study.Doubts);
        Assert.Empty(study.Rejected);
        Assert.Equal(("fell", FellStudy.Folder, null), (study.Name, study.Folder, study.Baseline));
        var only = Assert.Single(study.Cases);
        Assert.Equal(("clean", "Clean blades", "cases/clean.toml"), (only.Name, only.Title, only.File));
        Assert.Equal([5.0, 6.0, 7.0], only.Rotor.WindSpeeds.ToArray());
        var control = Assert.IsType<Control.FixedSpeed>(only.Rotor.Control);
        Assert.Equal(70 * Math.Tau / 60, control.RotorSpeed);
        Assert.Equal(2 * Math.PI / 180, control.Pitch, 15);
    }
}
