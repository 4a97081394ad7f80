namespace BladeLoads.Studies.Tests.Laboratory;

/// <summary>Tables as laboratories send them, invented here, with their rows as a reader takes them.</summary>
internal static partial class TablesThatAreRead
{
    private static readonly ForeignCase[] Surroundings =
    [
        new("names in prose above, remarks below", "", """
            Lift and drag coefficients against angle of attack
            measured 2019-05-03 at 23.5 C

            alpha cl cd
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            Mean of 3 runs
            End of file

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("remarks at the end of lines", "", """
            alpha cl cd  # names
            -5 -0.4 0.01
            0 0.1 0.009 # wobbly
            5 0.6 0.01 ! stall
            # 12 0.6 0.01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("a comment mark of its own", "--comment C", """
            C invented
            alpha cl cd
            -5 -0.4 0.01
            C now slower
            0 0.1 0.009
            5 0.6 0.01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("one section of two", "--section A", """
            section alpha cl cd
            A -5 -0.4 0.01
            A 0 0.1 0.009
            A 5 0.6 0.01
            B -5 -0.5 0.01
            B 0 0.0 0.009
            B 5 0.5 0.01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("a row of another section behind a comment mark", "", """
            section alpha cl cd
            A -5 -0.4 0.01
            A 0 0.1 0.009
            A 5 0.6 0.01
            # B 5 0.5 0.01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("a line of as many cells as a row, which names a Reynolds number, beside sections", "", """
            Re = 750000
            section alpha cl cd
            A -5 -0.4 0.01
            A 0 0.1 0.009
            A 5 0.6 0.01
            Re = 1500000 -
            A -5 -0.5 0.01
            A 0 0.1 0.009
            A 5 0.7 0.01

            """, """
            750000: -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            1500000: -5 -0.5 0.01 | 0 0.1 0.009 | 5 0.7 0.01
            """),
        new("some lines of a file", "--lines 5-8", """
            -5;-0,4;0,1
            0;0,1;0,9
            5;0,6;0,1

            alpha;cl;cd
            -5;-0,4;0,01
            0;0,1;0,009
            5;0,6;0,01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("a number in the prose above", "--columns alpha=1,cl=2,cd=3", """
            2019 05 03
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("whole numbers between commas, said", "--decimal point", """
            alpha,cl,cd
            -10,0,1
            0,1,0
            10,1,1

            """, """
            -10 0 1 | 0 1 0 | 10 1 1
            """),
        new("the same columns named again on each page", "", """
            tunnel 2, page 1
            alpha   cl    cd
            (deg)  (-)   (-)
            -5    -0.4  0.01
            0      0.1  0.009
            # tunnel 2, page 2
            alpha   cl    cd
            5      0.6  0.01

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
    ];
}
