namespace BladeLoads.Studies.Tests.Laboratory;

/// <summary>Tables that cannot be read, or can be read in two ways, invented here, with the whole text of the refusal.</summary>
internal static partial class TablesThatAreRefused
{
    private static readonly ForeignCase[] Columns =
    [
        new("columns that no line names", "", """
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            lab.txt:1:1: no line above names the columns; say which are which by number: --columns alpha=1,cl=2,cd=3
            """),
        new("a column that no number names", "--columns alpha=1,cl=2,cd=7", """
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            lab.txt:1:1: --columns cd=7: the table has columns 1 to 3
            """),
        new("a column beyond the last", "--columns cd=7", """
            alpha cl cd
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            lab.txt:1:1: --columns cd=7: the table has columns 1 to 3
            """),
        new("one column for two", "--columns cl=2,cd=2", """
            alpha cl cd
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            lab.txt:1:1: column 2 is taken for cl and cd; give each its own
            """),
        new("a name that no column has", "--columns cl=CLmax", """
            alpha cl cd
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            lab.txt:1:1: --columns cl=CLmax: no column has that name; there are alpha, cd, cl
            """),
        new("a name that two columns have", "--columns cl=cl", """
            alpha cl cl cd
            -5 -0.4 1 0.01
            0 0.1 1 0.009
            5 0.6 1 0.01

            """, """
            lab.txt:1:1: --columns cl=cl: 'cl' (column 2) and 'cl' (column 3) have that name; give the number of the one that is meant
            """),
        new("two columns that can be lift", "", """
            alpha;CL;Cl;cd
            -5;-0,4;0;0,01
            0;0,1;1;0,009
            5;0,6;0;0,01

            """, """
            lab.txt:1:1: 'CL' (column 2) and 'Cl' (column 3) can both be the lift coefficient; say which: --columns cl=2 or cl=3
            """),
        new("a corrected angle beside another", "", """
            alpha;alpha_corr;cl;cd
            -5;-5,1;0;0,01
            0;-0,1;1;0,009
            5;4,9;0;0,01

            """, """
            lab.txt:1:1: 'alpha' (column 1) and 'alpha_corr' (column 2) can both be the angle of attack; say which: --columns alpha=1 or alpha=2
            """),
        new("a measured Reynolds number beside another, two moments", "", """
            alpha;cl;cd;re;re_measured;cm;cm_c/4
            -5;0;0,01;1000000;1010000;0;0
            0;1;0,009;1000000;1020000;0;0
            5;0;0,01;1000000;1030000;0;0

            """, """
            lab.txt:1:1: 'cm' (column 6) and 'cm_c/4' (column 7) can both be the moment coefficient; say which: --columns cm=6 or cm=7, or cm=none
            lab.txt:1:1: 're' (column 4) and 're_measured' (column 5) can both be the Reynolds number; say which: --columns reynolds=4 or reynolds=5, or reynolds=none
            """),
        new("letters that mean one thing here and another there", "", """
            alpha;ca;cw
            -5;-0,4;0,01
            0;0,1;0,009
            5;0,6;0,01

            """, """
            lab.txt:1:1: no column is plainly the drag coefficient; 'cw' (column 3) may be it or something else: --columns cd=3 takes it
            lab.txt:1:1: no column is plainly the lift coefficient; 'ca' (column 2) may be it or something else: --columns cl=2 takes it
            """),
        new("pressure drag alone", "", """
            alpha;cl;cd_pressure
            -5;-0,4;0,01
            0;0,1;0,009
            5;0,6;0,01

            """, """
            lab.txt:1:1: no column is plainly the drag coefficient; 'cd_pressure' (column 3) may be it or something else: --columns cd=3 takes it
            """),
        new("forces in place of lift and drag", "", """
            alpha;cn;ct
            -5;-0,4;0,01
            0;0,1;0,009
            5;0,6;0,01

            """, """
            lab.txt:1:1: no columns for lift and drag; 'cn' (column 2) and 'ct' (column 3) are forces square to the chord and along it, which are turned by --columns normal=2,tangential=3 where the second is positive towards the leading edge, or axial=3 where it is positive towards the trailing edge
            """),
        new("lift and no drag", "", """
            alpha;cl
            -5;-0,4
            0;0,1
            5;0,6

            """, """
            lab.txt:1:1: no column for the drag coefficient; there are alpha, cl: --columns cd=<number> takes one
            """),
        new("Reynolds numbers side by side", "", """
            alpha;cl(1e6);cd(1e6);cl(2e6);cd(2e6)
            -5;-0,4;0,01;-0,4;0,01
            0;0,1;0,009;0,1;0,008
            5;0,6;0,01;0,6;0,01

            """, """
            lab.txt:1:1: no column is plainly the drag coefficient; 'cd(1e6)' (column 3) and 'cd(2e6)' (column 5) may be it or something else: --columns cd=3 or cd=5 takes it
            lab.txt:1:1: no column is plainly the lift coefficient; 'cl(1e6)' (column 2) and 'cl(2e6)' (column 4) may be it or something else: --columns cl=2 or cl=4 takes it
            """),
        new("one name for two columns", "", """
            alpha;cl;cd;cd
            -5;-0,4;0,01;0,02
            0;0,1;0,009;0,02
            5;0,6;0,01;0,02

            """, """
            lab.txt:1:1: 'cd' (column 3) and 'cd' (column 4) can both be the drag coefficient; say which: --columns cd=3 or cd=4
            """),
        new("numbers of columns but for one that is forgotten", "--columns alpha=1,cl=2", """
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            lab.txt:1:1: no line above names the columns, and --columns does not say which is cd; add cd=<number>
            """),
        new("the number of one column alone", "--columns alpha=1", """
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            lab.txt:1:1: no line above names the columns, and --columns does not say which is cl and which cd; add cl=<number> and cd=<number>
            """),
        new("a name and a number of columns that no line names", "--columns alpha=1,cl=CLmax", """
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            lab.txt:1:1: no line above names 'CLmax', or columns known here; say which are which by number: --columns alpha=1,cl=2,cd=3
            """),
        new("columns counted from 0", "--columns alpha=0,cl=1,cd=2", """
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            lab.txt:1:1: --columns alpha=0: the table has columns 1 to 3
            """),
        new("a column of words said to be the lift", "--columns alpha=1,cl=3,cd=2", """
            -5 0.01 low
            0 0.009 low
            5 0.01 high

            """, """
            lab.txt:1:1: --columns cl=3: that column holds 'low' here, no number
            """),
        new("names set apart by blanks above rows set apart by commas", "", """
            alpha cl cd cm
            -5,-0.4,0.01,0
            0,0.1,0.009,0
            5,0.6,0.01,0

            """, """
            lab.txt:1:1: names columns with blanks between them where line 2 has commas; put commas here too, or say which are which by number: --columns alpha=1,cl=2,cd=3
            """),
        new("a name in quotes with a line break", "", """
            "alpha
            [deg]",cl,cd
            -5,-0.4,0.01
            0,0.1,0.009
            5,0.6,0.01

            """, """
            lab.txt:1:1: has a cell in quotes that goes on in the next line; put the names of the columns into one line
            """),
        new("our own words for forces as names", "", """
            alpha normal axial
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01

            """, """
            lab.txt:1:1: no columns for lift and drag; 'normal' (column 2) and 'axial' (column 3) are forces square to the chord and along it, which are turned by --columns normal=2,tangential=3 where the second is positive towards the leading edge, or axial=3 where it is positive towards the trailing edge
            """),
        new("commas between columns and as decimal signs, with blanks", "", """
            alpha, cl, cd
            -4, -0,28, 0,0101
            0, 0,19, 0,0098
            4, 0,66, 0,0104

            """, """
            lab.txt:1:1: names 3 columns where line 2 has 5 values; commas seem to separate columns and to be decimal signs too, so save the table with semicolons
            """),
        new("the same below names set apart by blanks", "", """
            alpha cl cd
            -4, -0,28, 0,0101
            0, 0,19, 0,0098
            4, 0,66, 0,0104

            """, """
            lab.txt:1:1: names 3 columns where line 2 has 5 values; commas seem to separate columns and to be decimal signs too, so save the table with semicolons
            """),
    ];
}
