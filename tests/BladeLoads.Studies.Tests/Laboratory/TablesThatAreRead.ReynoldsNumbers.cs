namespace BladeLoads.Studies.Tests.Laboratory;

/// <summary>Tables as laboratories send them, invented here, with their rows as a reader takes them.</summary>
internal static partial class TablesThatAreRead
{
    private static readonly ForeignCase[] ReynoldsNumbers =
    [
        new("blocks that lines with a Reynolds number announce", "", """
            Re = 1.0e6
            alpha cl cd
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01
            Reynolds 2 000 000
            alpha cl cd
            -5 -0.41 0.01
            0 0.11 0.009
            5 0.61 0.01

            """, """
            1000000: -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            2000000: -5 -0.41 0.01 | 0 0.11 0.009 | 5 0.61 0.01
            """),
        new("blocks in falling order of angles and Reynolds numbers in millions", "", """
            alpha cl cd
            Re (millions) 1.5
            5 0.6 0.01
            0 0.1 0.009
            -5 -0.4 0.01
            Re (millions) 0.75
            5 0.61 0.01
            0 0.11 0.009
            -5 -0.41 0.01

            """, """
            750000: -5 -0.41 0.01 | 0 0.11 0.009 | 5 0.61 0.01
            1500000: -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("a column of Reynolds numbers in millions", "", """
            Re [10^6];alpha;cl;cd
            1,5;-5;-0,4;0,01
            1,5;0;0,1;0,009
            1,5;5;0,6;0,01

            """, """
            1500000: -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("a column of Reynolds numbers with thousands set apart", "", """
            Re;alpha;cl;cd
            1.500.000;-5;-0,4;0,01
            1.500.000;0;0,1;0,009
            1.500.000;5;0,6;0,01

            """, """
            1500000: -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("Reynolds numbers that go to and fro", "", """
            alpha,cl,cd,reynolds
            -5,-0.4,0.01,2e6
            -5,-0.3,0.01,1e6
            0,0.1,0.009,2e6
            0,0.2,0.009,1e6
            5,0.6,0.01,2e6
            5,0.5,0.01,1e6

            """, """
            1000000: -5 -0.3 0.01 | 0 0.2 0.009 | 5 0.5 0.01
            2000000: -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("one Reynolds number, said", "--reynolds 1.5e6", """
            alpha cl cd
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            1500000: -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("a Reynolds number in a line of cells", "", """
            Re;1000000;;
            alpha;cl;cd;
            -5;-0,4;0,01;
            0;0,1;0,009;
            5;0,6;0,01;

            """, """
            1000000: -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("a Reynolds number among others", "", """
            Re=1.5x10^6, Ma=0.1, Tu 0.07 %
            alpha cl cd
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            1500000: -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("a Reynolds number raised by a sign", "", """
            Reynolds number 1.5·10⁶
            alpha cl cd
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            1500000: -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("a Reynolds number in another language", "", """
            Reynolds-Zahl: 1.500.000
            alpha cl cd
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            1500000: -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("Reynolds numbers not wanted", "--columns reynolds=none", """
            Re = 1 or 2
            alpha cl cd re
            -5 -0.4 0.01 1010000
            0 0.1 0.009 1020000
            5 0.6 0.01 1030000

            """, """
            -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            """),
        new("a column in millions that nothing but an option says", "--reynolds millions", """
            Re;alpha;cl;cd
            1,0;-5;-0,4;0,01
            1,0;0;0,1;0,009
            1,0;5;0,6;0,01
            3,0;-5;-0,41;0,01
            3,0;0;0,11;0,009
            3,0;5;0,61;0,01

            """, """
            1000000: -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            3000000: -5 -0.41 0.01 | 0 0.11 0.009 | 5 0.61 0.01
            """),
        new("lines in thousands that nothing but an option says, beside one that has its unit", "--reynolds thousands", """
            alpha cl cd
            Re = 750
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01
            Re = 1.5 million
            -5 -0.41 0.01
            0 0.11 0.009
            5 0.61 0.01

            """, """
            750000: -5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01
            1500000: -5 -0.41 0.01 | 0 0.11 0.009 | 5 0.61 0.01
            """),
    ];
}
