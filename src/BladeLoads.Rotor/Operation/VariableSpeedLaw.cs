namespace BladeLoads.Rotor.Operation;

/// <summary>Rotor speed of a variable-speed machine.</summary>
internal static class VariableSpeedLaw
{
    /// <summary>Below rated: fine pitch, and <c>W = tip-speed ratio x V / (R cos cone)</c> held between the limits.</summary>
    /// <param name="sweptRadius">R cos cone, m.</param>
    public static Setting FinePitchAt(Control.VariableSpeed control, double windSpeed, double sweptRadius)
    {
        var wanted = control.TipSpeedRatio * windSpeed / sweptRadius;
        var (rotorSpeed, region) = wanted < control.MinRotorSpeed ? (control.MinRotorSpeed, Region.MinimumSpeed)
            : wanted > control.MaxRotorSpeed ? (control.MaxRotorSpeed, Region.MaximumSpeed)
            : (wanted, Region.BestTipSpeedRatio);
        return new Setting(new OperatingPoint(windSpeed, rotorSpeed, control.FinePitch), region, PointMarks.None);
    }
}
