namespace BladeLoads.Studies.Tests.Laboratory;

/// <summary>Tables as laboratories send them, invented here, with their rows as a reader takes them.</summary>
internal static partial class TablesThatAreRead
{
    private static readonly ForeignCase[] Quantities =
    [
        new("radians named by the header", "", """
            alpha (rad);cl;cd
            -0,1;-0,4;0,01
            0;0,1;0,009
            0,2;0,6;0,01

            """, """
            -5.72957795131 -0.4 0.01 | 0 0.1 0.009 | 11.4591559026 0.6 0.01
            """),
        new("radians named by a row of units", "", """
            alpha;cl;cd
            rad;-;-
            -0,1;-0,4;0,01
            0;0,1;0,009
            0,2;0,6;0,01

            """, """
            -5.72957795131 -0.4 0.01 | 0 0.1 0.009 | 11.4591559026 0.6 0.01
            """),
        new("radians that round pi up", "--angles radians", """
            alpha;cl;cd
            -3,1416;-0,4;0,01
            0;0,1;0,009
            3,1416;-0,4;0,01

            """, """
            -180 -0.4 0.01 | 0 0.1 0.009 | 180 -0.4 0.01
            """),
        new("forces, the second forwards", "--columns normal=2,tangential=3", """
            alpha cn ct
            -90 -1 0.5
            0 1 -0.5
            90 1 0.25

            """, """
            -90 -0.5 1 | 0 1 0.5 | 90 0.25 1
            """),
        new("forces, the second backwards", "--columns normal=2,axial=3", """
            alpha cn ca
            -90 -1 -0.5
            0 1 0.5
            90 1 -0.25

            """, """
            -90 -0.5 1 | 0 1 0.5 | 90 0.25 1
            """),
        new("columns beside that are not wanted", "", """
            "run";"alpha";"cl";"cd";"cl/cd";"remark"
            "a;b";-5;-0,4;0,01;-40;
            "c";0;0,1;0,009;11;"fine"
            "d";5;0,6;0,01;60;

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("pressure drag beside drag", "", """
            alpha,cl,cd,cd_pressure,cm_le
            -5,-0.4,0.01,0.001,0.1
            0,0.1,0.009,0.001,0.1
            5,0.6,0.01,0.001,0.1

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("names as they are set in formulas", "", """
            $\alpha$ [°];$C_L$;$C_{D}$;$C_{m,c/4}$
            -5;-0,4;0,01;-0,1
            0;0,1;0,009;-0,1
            5;0,6;0,01;-0,1

            """, """
            -5 -0.4 0.01 -0.1 | 0 0.1 0.009 -0.1 | 5 0.6 0.01 -0.1
            """),
        new("Greek, subscripts, minus signs of typesetters", "", """
            α [°];Cₗ;C_d
            −5;−0,4;0,01
            0;0,1;0,009
            5;0,6;0,01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("angles from 0 to 360 degrees", "--wrap", """
            alpha cl cd
            0 0.1 0.009
            90 0.1 1.8
            180 -0.1 0.03
            270 -0.1 1.8
            350 -0.8 0.02
            360 0.1 0.009

            """, """
            -90 -0.1 1.8 | -10 -0.8 0.02 | 0 0.1 0.009 | 90 0.1 1.8 | 180 -0.1 0.03
            """),
        new("radians from 0 to 2 pi, rounded up at both", "--angles radians --wrap", """
            alpha cl cd
            0 0.1 0.009
            1.5708 0.1 1.8
            3.1416 -0.1 0.03
            4.7124 -0.1 1.8
            6.2832 0.1 0.009

            """, """
            -89.999368623 -0.1 1.8 | 0 0.1 0.009 | 90.0002104591 0.1 1.8 | 180 -0.1 0.03
            """),
        new("angles from -360 to 0 degrees", "--wrap", """
            alpha cl cd
            -360 0.1 0.009
            -350 0.8 0.02
            -180 -0.1 0.03
            -90 -0.1 1.8
            0 0.1 0.009

            """, """
            -180 -0.1 0.03 | -90 -0.1 1.8 | 0 0.1 0.009 | 10 0.8 0.02
            """),
        new("normal force beside lift", "", """
            alpha,cl,cd,cn,ct
            -5,-0.4,0.01,-0.4,0
            0,0.1,0.009,0.1,0
            5,0.6,0.01,0.6,0

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("a moment that is not wanted", "--columns cm=none", """
            alpha,cl,cd,cm,cm_c/4
            -5,-0.4,0.01,0,-0.1
            0,0.1,0.009,,-0.1
            5,0.6,0.01,0,-0.1

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("one of two versions, said", "--columns alpha=2", """
            alpha;alpha_corr;cl;cd
            -5;-5,1;-0,4;0,01
            0;-0,1;0,1;0,009
            5;4,9;0,6;0,01

            """, """
            -5.1 -0.4 0.01 | -0.1 0.1 0.009 | 4.9 0.6 0.01
            """),
        new("degree signs beside the angles", "", """
            alpha;cl;cd
            -3°;-0,4;0,01
            0º;0,1;0,009
            4°;0,6;0,01

            """, """
            -3 -0.4 0.01 | 0 0.1 0.009 | 4 0.6 0.01
            """),
        new("degree signs and no header", "--columns alpha=1,cl=2,cd=3", """
            -4° -0.4 0.01
            0° 0.1 0.009
            4° 0.6 0.01

            """, """
            -4 -0.4 0.01 | 0 0.1 0.009 | 4 0.6 0.01
            """),
        new("degrees said of a column of radians that can be none", "--angles degrees", """
            alpha [rad];cl;cd
            -4;-0,4;0,01
            0;0,1;0,009
            4;0,6;0,01

            """, """
            -4 -0.4 0.01 | 0 0.1 0.009 | 4 0.6 0.01
            """),
    ];
}
