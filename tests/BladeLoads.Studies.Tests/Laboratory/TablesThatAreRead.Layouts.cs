namespace BladeLoads.Studies.Tests.Laboratory;

/// <summary>Tables as laboratories send them, invented here, with their rows as a reader takes them.</summary>
internal static partial class TablesThatAreRead
{
    private static readonly ForeignCase[] Layouts =
    [
        new("semicolons and decimal commas", "", """
            Alpha;CL;CD
            -5;-0,4;0,01
            0;0,1;0,009
            5;0,6;0,01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("semicolons, decimal points, separators at the end", "", """
            Alpha;CL;CD;
            -5;-0.4;0.01;
            0;0.1;0.009;
            5;0.6;0.01;

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("bars with outer bars and a ruling", "", """
            | alpha (deg) | cl | cd |
            |-------------|----|----|
            | -5 | -0.4 | 0.01 |
            | 0 | 0.1 | 0.009 |
            | 5 | 0.6 | 0.01 |

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("commas between quoted decimal commas", "", """
            "alpha","cl","cd"
            "-5,0","-0,4","0,01"
            "0,0","0,1","0,009"
            "5,0","0,6","0,01"

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("tabs, with blanks about", "", """
            alpha<TAB> cl<TAB>cd
            -5<TAB>-0.4 <TAB>0.01
            0<TAB> 0.1<TAB>0.009
            5<TAB>0.6<TAB>0.01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("fixed columns that blanks separate, decimal commas", "", """
               alpha      cl       cd
              -5,00   -0,4000  0,01000
               0,00    0,1000  0,00900
               5,00    0,6000  0,01000

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("commas with blanks", "", """
            alpha, cl, cd
            -5.0, -0.4, 0.01
            0.0, 0.1, 0.009
            5.0, 0.6, 0.01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("no header, columns by number", "--columns alpha=2,cl=3,cd=4", """
            1 -5 -0.4 0.01
            2 0 0.1 0.009
            3 5 0.6 0.01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("columns by the names of their header", "--columns alpha=x,cl=y_2,cd=z", """
            x,y 2,z
            -5,-0.4,0.01
            0,0.1,0.009
            5,0.6,0.01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("a header in a comment", "", """
            # tunnel 2, entry 14
            # alpha cl cd
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("names of several words", "", """
            Angle of attack  Lift coefficient  Drag coefficient
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("names of several words, single blanks", "", """
            Angle of attack lift coefficient drag coefficient
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("a row of units below the header", "", """
            alpha cl cd
            deg - -
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("units in brackets with blanks, and a ruling", "", """
            alpha [deg] cl [-] cd [-]
            -----------------
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("exponents with D, points without digits", "", """
            alpha cl cd
            -5.0D+00 -4.0D-01 1E-2
            0.0D+00 +.1 9.e-3
            5.0D+00 0.6 0.01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
    ];
}
