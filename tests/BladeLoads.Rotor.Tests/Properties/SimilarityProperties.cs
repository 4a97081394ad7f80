using BladeLoads.Rotor.Air;
using BladeLoads.Rotor.Blades;
using BladeLoads.Rotor.Loads;
using CsCheck;

namespace BladeLoads.Rotor.Tests.Properties;

/// <summary>
/// Laws of similarity. Factors of two move no digit but the exponent, so the comparison is as sharp as sums allow; and the domain is
/// tables without Reynolds numbers, for a changed size or density changes those.
/// </summary>
public sealed class SimilarityProperties
{
    private const int Trials = 10_000;

    [Fact]
    public void A_rotor_twice_the_size_makes_four_times_the_power_at_one_wind_and_tip_speed()
        => Compare(trial => trial.At(trial.Operation with { RotorSpeed = trial.Operation.RotorSpeed / 2 }, rotor => rotor with
        {
            Blade = Blade.FromStations(rotor.Blade.Stations.Select(s => s with { Radius = 2 * s.Radius, Chord = 2 * s.Chord })),
        }), power: 4, thrust: 4, torque: 8, rootMoment: 8);

    [Fact]
    public void Twice_the_air_density_is_twice_the_thrust_and_the_power()
        => Compare(trial => trial.At(trial.Operation, rotor => rotor with
        {
            Air = new AirProperties(2 * rotor.Air.Density, rotor.Air.DynamicViscosity, 340.29),
        }), power: 2, thrust: 2, torque: 2, rootMoment: 2);

    [Fact]
    public void Twice_the_wind_at_one_tip_speed_ratio_is_eight_times_the_power()
        => Compare(trial => trial.At(
            trial.Operation with { WindSpeed = 2 * trial.Operation.WindSpeed, RotorSpeed = 2 * trial.Operation.RotorSpeed },
            rotor => rotor), power: 8, thrust: 4, torque: 4, rootMoment: 4);

    private static void Compare(Func<Trial, Trial> change, double power, double thrust, double torque, double rootMoment)
        => FixedSample.ForEach(PlausibleRotors.Trials.Select(trial => Without.ReynoldsNumbers(trial)), Trials, trial =>
        {
            var (before, after) = (trial.Solve(), change(trial).Solve());
            Assert.Equal(before.Marks, after.Marks);
            if (before.Loads is not { } one || after.Loads is not { } other)
                return;
            Near(power, one.Power, other.Power, nameof(RotorLoads.Power));
            Near(thrust, one.Thrust, other.Thrust, nameof(RotorLoads.Thrust));
            Near(torque, one.Torque, other.Torque, nameof(RotorLoads.Torque));
            Near(rootMoment, one.RootFlapwiseMoment, other.RootFlapwiseMoment, nameof(RotorLoads.RootFlapwiseMoment));
            Near(1, one.PowerCoefficient, other.PowerCoefficient, nameof(RotorLoads.PowerCoefficient));

            static void Near(double factor, double before, double after, string what)
                => Assert.True(Math.Abs(factor * before - after) <= 1e-12 * Math.Abs(after), $"{what}: {after:R}, {factor} times {before:R}");
        });
}
