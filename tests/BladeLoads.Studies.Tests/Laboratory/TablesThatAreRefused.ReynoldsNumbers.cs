namespace BladeLoads.Studies.Tests.Laboratory;

/// <summary>Tables that cannot be read, or can be read in two ways, invented here, with the whole text of the refusal.</summary>
internal static partial class TablesThatAreRefused
{
    private static readonly ForeignCase[] ReynoldsNumbers =
    [
        new("two Reynolds numbers above one block", "", """
            Re 1e6
            Reynolds number: 2e6
            alpha cl cd
            0 0.1 0.009
            10 0.9 0.02
            20 1.0 0.05

            """, """
            lab.txt:2:1: names a Reynolds number of 2000000 and line 1 one of 1000000, with no row between; say it with --reynolds
            """),
        new("Reynolds numbers in words", "", """
            Reynolds numbers from 1e5 to 1e6
            alpha cl cd
            0 0.1 0.009
            10 0.9 0.02
            20 1.0 0.05

            """, """
            lab.txt:1:1: 'Reynolds numbers from 1e5 to 1e6' names a Reynolds number in a way that is not understood; write it as Re = 1.5e6, say it with --reynolds, or say --columns reynolds=none for a table without
            """),
        new("a Reynolds number without its unit", "", """
            Re = 1.5
            alpha cl cd
            0 0.1 0.009
            10 0.9 0.02
            20 1.0 0.05

            """, """
            lab.txt:1:1: 'Re = 1.5' names a Reynolds number of 1.5, and those of blades are 1e4 to 1e9, so give its unit (--reynolds millions or thousands); write it as Re = 1.5e6, say it with --reynolds, or say --columns reynolds=none for a table without
            """),
        new("a column of Reynolds numbers without its unit", "", """
            alpha cl cd Re
            0 0.1 0.009 1.5
            10 0.9 0.02 1.5
            20 1.0 0.05 1.5

            """, """
            lab.txt:2:13: reynolds is '1.5'; Reynolds numbers of blades are 1e4 to 1e9. Is it in millions? Then say --reynolds millions
            lab.txt:3:13: reynolds is '1.5'; Reynolds numbers of blades are 1e4 to 1e9. Is it in millions? Then say --reynolds millions
            lab.txt:4:13: reynolds is '1.5'; Reynolds numbers of blades are 1e4 to 1e9. Is it in millions? Then say --reynolds millions
            """),
        new("a first block without a Reynolds number", "", """
            alpha cl cd
            0 0.1 0.009
            10 0.9 0.02
            20 1.0 0.05
            Re = 1e6
            0 0.1 0.009
            10 0.9 0.02
            20 1.0 0.05

            """, """
            lab.txt:5:1: names a Reynolds number of 1000000 below rows that have none (line 2); say it with --reynolds, or choose rows with --lines
            """),
        new("a Reynolds number below the rows", "", """
            Re 5e5
            alpha cl cd
            0 0.1 0.009
            10 0.9 0.02
            20 1.0 0.05
            Re 1e6

            """, """
            lab.txt:6:1: names a Reynolds number of 1000000 and no row stands below; choose rows with --lines
            """),
        new("another Reynolds number than is said", "--reynolds 2e6", """
            Re = 1e6
            alpha cl cd
            0 0.1 0.009
            10 0.9 0.02
            20 1.0 0.05

            """, """
            lab.txt:1:1: names a Reynolds number of 1000000 and --reynolds says 2000000; leave --reynolds out, or say --columns reynolds=none besides if the line is not meant so
            """),
        new("another Reynolds number in a column than is said", "--reynolds 2e6", """
            alpha cl cd re
            0 0.1 0.009 1e6
            10 0.9 0.02 1e6
            20 1.0 0.05 1e6

            """, """
            lab.txt:2:1: the Reynolds number here is 1000000 and --reynolds says 2000000; leave the column out with --columns reynolds=none, or --reynolds
            """),
        new("a Reynolds number of its own for each row", "", """
            alpha cl cd re
            0 0.1 0.009 1010000
            5 0.1 0.009 1020000
            10 0.9 0.02 1030000
            20 1.0 0.05 1040000

            """, """
            lab.txt:2: has 1 row at Reynolds number 1010000; a polar needs three or more; where each row has a measured Reynolds number of its own, say --columns reynolds=none and --reynolds
            lab.txt:3: has 1 row at Reynolds number 1020000; a polar needs three or more; where each row has a measured Reynolds number of its own, say --columns reynolds=none and --reynolds
            lab.txt:4: has 1 row at Reynolds number 1030000; a polar needs three or more; where each row has a measured Reynolds number of its own, say --columns reynolds=none and --reynolds
            lab.txt:5: and 1 more like it
            """),
        new("several Reynolds numbers in one line", "", """
            Re = 1e6, 2e6
            alpha cl cd
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            lab.txt:1:1: 'Re = 1e6, 2e6' names more than one Reynolds number; write it as Re = 1.5e6, say it with --reynolds, or say --columns reynolds=none for a table without
            """),
        new("a Reynolds number with a sign that may be decimal or not", "", """
            Re: 12,345 thousand
            alpha cl cd
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            lab.txt:1:1: 'Re: 12,345 thousand' names a Reynolds number that can be 12345 or 12345000; write it as Re = 1.5e6, say it with --reynolds, or say --columns reynolds=none for a table without
            """),
        new("millions said of Reynolds numbers that are none", "--reynolds millions", """
            Re = 1000000
            alpha cl cd
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            lab.txt:1:1: 'Re = 1000000' names a Reynolds number of 1000000, and those of blades are 1e4 to 1e9; write it as Re = 1.5e6, say it with --reynolds, or say --columns reynolds=none for a table without
            """),
        new("millions said of a column that is in none", "--reynolds millions", """
            alpha cl cd Re
            -5 -0.4 0.01 1000000
            0 0.1 0.009 1
            5 0.6 0.01 1

            """, """
            lab.txt:2:14: reynolds is '1000000'; Reynolds numbers of blades are 1e4 to 1e9, and --reynolds says millions
            """),
        new("millions said of a column that names thousands", "--reynolds millions", """
            alpha;cl;cd;re [10^3]
            -5;-0.4;0.01;1000
            0;0.1;0.009;1000
            5;0.6;0.01;1000

            """, """
            lab.txt: --reynolds says millions, and 're [10^3]' (column 4) names another unit; leave --reynolds out, or correct the name
            """),
        new("millions said where nothing names a Reynolds number", "--reynolds millions", """
            alpha cl cd
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            lab.txt: --reynolds says millions, and the table names no Reynolds number; give it as a number: --reynolds 1.5e6
            """),
        new("thousands said of Reynolds numbers that are not wanted", "--reynolds thousands --columns reynolds=none", """
            Re = 1000
            alpha cl cd
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            lab.txt: --reynolds says thousands, and --columns reynolds=none that none is taken; leave one of the two out
            """),
    ];
}
