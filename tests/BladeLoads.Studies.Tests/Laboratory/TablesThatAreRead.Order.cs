namespace BladeLoads.Studies.Tests.Laboratory;

/// <summary>Tables as laboratories send them, invented here, with their rows as a reader takes them.</summary>
internal static partial class TablesThatAreRead
{
    private static readonly ForeignCase[] Order =
    [
        new("falling angles", "", """
            alpha cl cd
            5 0.6 0.01
            0 0.1 0.009
            -5 -0.4 0.01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("up from 0, then down from 0", "", """
            alpha cl cd
            0 0.1 0.009
            5 0.6 0.01
            10 0.9 0.02
            0 0.1 0.009
            -5 -0.4 0.01
            -10 -0.7 0.02

            """, """
            -10 -0.7 0.02 | -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01 | 10 0.9 0.02
            """),
        new("rows twice", "", """
            alpha cl cd
            -5 -0.4 0.01
            0 0.1 0.009
            0.0 0.10 0.0090
            5 0.6 0.01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("the rising sweep of two", "--sweep rising", """
            alpha cl cd
            -5 -0.4 0.01
            0 0.1 0.009
            10 0.9 0.02
            20 1.0 0.05
            10 0.6 0.04
            0 0.1 0.009
            -5 -0.4 0.01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 10 0.9 0.02 | 20 1 0.05
            """),
        new("the falling sweep of two", "--sweep falling", """
            alpha cl cd
            -5 -0.4 0.01
            0 0.1 0.009
            10 0.9 0.02
            20 1.0 0.05
            10 0.6 0.04
            0 0.1 0.009
            -5 -0.4 0.01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 10 0.6 0.04 | 20 1 0.05
            """),
        new("the mean of two sweeps", "--sweep mean", """
            alpha cl cd
            -5 -0.4 0.01
            0 0.1 0.009
            10 0.9 0.02
            20 1.0 0.05
            10 0.6 0.04
            0 0.1 0.009
            -5 -0.4 0.01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 10 0.75 0.03 | 20 1 0.05
            """),
        new("the mean of two sweeps with the turn measured twice", "--sweep mean", """
            alpha cl cd cm
            -4 -0.3 0.01 -0.07
            4 0.6 0.01 -0.08
            14 1.3 0.05 -0.1
            14 1.2 0.06 -0.12
            4 0.5 0.02 -0.08
            -4 -0.3 0.01 -0.07

            """, """
            -4 -0.3 0.01 -0.07 | 4 0.55 0.015 -0.08 | 14 1.25 0.055 -0.11
            """),
        new("the rising sweep of two with the turn measured twice", "--sweep rising", """
            alpha cl cd cm
            -4 -0.3 0.01 -0.07
            4 0.6 0.01 -0.08
            14 1.3 0.05 -0.1
            14 1.2 0.06 -0.12
            4 0.5 0.02 -0.08
            -4 -0.3 0.01 -0.07

            """, """
            -4 -0.3 0.01 -0.07 | 4 0.6 0.01 -0.08 | 14 1.3 0.05 -0.1
            """),
        new("the falling sweep of two with the turn measured twice", "--sweep falling", """
            alpha cl cd cm
            -4 -0.3 0.01 -0.07
            4 0.6 0.01 -0.08
            14 1.3 0.05 -0.1
            14 1.2 0.06 -0.12
            4 0.5 0.02 -0.08
            -4 -0.3 0.01 -0.07

            """, """
            -4 -0.3 0.01 -0.07 | 4 0.5 0.02 -0.08 | 14 1.2 0.06 -0.12
            """),
        new("the rising sweep that comes second, with the turn measured twice", "--sweep rising", """
            alpha cl cd
            14 1.2 0.06
            4 0.5 0.02
            -4 -0.4 0.01
            -4 -0.3 0.01
            4 0.6 0.01
            14 1.2 0.06

            """, """
            -4 -0.3 0.01 | 4 0.6 0.01 | 14 1.2 0.06
            """),
        new("two angles a step apart that no one measures, with the same values", "", """
            alpha cl cd
            -5 -0.4 0.01
            2 0.3 0.009
            2.0000001 0.3 0.009
            5 0.6 0.01

            """, """
            -5 -0.4 0.01 | 2 0.3 0.009 | 2.0000001 0.3 0.009 | 5 0.6 0.01
            """),
        new("rows of two sweeps together", "--sweep all", """
            alpha cl cd
            0 0.1 0.009
            10 0.9 0.02
            20 1.0 0.05
            11 0.6 0.04
            0 0.1 0.009

            """, """
            0 0.1 0.009 | 10 0.9 0.02 | 11 0.6 0.04 | 20 1 0.05
            """),
        new("rows without a value left out", "--leave-out incomplete", """
            alpha;cl;cd
            -5;-0,4;0,01
            -2;;0,009
            0;0,1;0,009
            2;0,3;n/a
            #N/A;0,4;0,009
            5;0,6;0,01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("rows with a drag below 0 left out", "--leave-out negative-drag", """
            alpha cl cd
            -5 -0.4 0.01
            0 0.1 -0.0003
            2 0.3 0.009
            5 0.6 0.01

            """, """
            -5 -0.4 0.01 | 2 0.3 0.009 | 5 0.6 0.01
            """),
    ];
}
