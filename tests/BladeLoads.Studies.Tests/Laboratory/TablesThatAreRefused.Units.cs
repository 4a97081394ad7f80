namespace BladeLoads.Studies.Tests.Laboratory;

/// <summary>Tables that cannot be read, or can be read in two ways, invented here, with the whole text of the refusal.</summary>
internal static partial class TablesThatAreRefused
{
    private static readonly ForeignCase[] Units =
    [
        new("drag in percent", "", """
            alpha;cl;cd [%]
            -5;-0,4;1,01
            0;0,1;0,9
            5;0,6;1,01

            """, """
            lab.txt:1:1: 'cd [%]' (column 3) is a multiple of the drag coefficient, and only the ratio itself is read; where its numbers are ratios all the same, leave the line of names out with --lines and say --columns by number
            """),
        new("drag in percent, in a row of units", "", """
            alpha;cl;cd
            deg;-;%
            -5;-0,4;1,01
            0;0,1;0,9
            5;0,6;1,01

            """, """
            lab.txt:2:7: names '%' as the unit of cd; only ratios are read, so give the table as such
            """),
        new("lift with its sign turned", "--columns cl=2", """
            alpha;-cl;cd
            -5;0,4;0,01
            0;-0,1;0,009
            5;-0,6;0,01

            """, """
            lab.txt:1:1: '-cl' (column 2) is a multiple of the lift coefficient, and only the ratio itself is read; where its numbers are ratios all the same, leave the line of names out with --lines and say --columns by number
            """),
        new("a unit of the angle that means one thing here and another there", "", """
            alpha [grad];cl;cd
            -5;-0,4;0,01
            0;0,1;0,009
            5;0,6;0,01

            """, """
            lab.txt:1:1: no column is plainly the angle of attack; 'alpha [grad]' (column 1) may be it or something else: --columns alpha=1 takes it
            """),
        new("the same, taken", "--columns alpha=1", """
            alpha [grad];cl;cd
            -5;-0,4;0,01
            0;0,1;0,009
            5;0,6;0,01

            """, """
            lab.txt:1:1: 'alpha [grad]' (column 1) names a unit that is not known; say --angles degrees or --angles radians, and give other units as one of these
            """),
        new("the same, in a row of units", "", """
            alpha;cl;cd
            grad;-;-
            -5;-0,4;0,01
            0;0,1;0,009
            5;0,6;0,01

            """, """
            lab.txt:2:1: 'grad;-;-' stands between the names of the columns and the first row and is not understood; put a comment mark before it, or say with --comment how it begins
            """),
        new("angles that may be degrees or radians", "", """
            alpha;cl;cd
            -3;-0,4;0,01
            0;0,1;0,009
            3;0,6;0,01

            """, """
            lab.txt:2:1: alpha runs from -3 to 3 only, and nothing says whether in degrees or radians; say --angles degrees or --angles radians
            """),
        new("angles from 0 to 6 that may be degrees or radians", "", """
            alpha;cl;cd
            0;-0,4;0,01
            3;0,1;0,009
            6;0,6;0,01

            """, """
            lab.txt:2:1: alpha runs from 0 to 6 only, and nothing says whether in degrees or radians; say --angles degrees or --angles radians
            """),
        new("degrees and too narrow for any case", "--angles degrees", """
            alpha;cl;cd
            -3;-0,4;0,01
            0;0,1;0,009
            3;0,6;0,01

            """, """
            lab.txt:2: angles run from -3 to 3 degrees only; no case reads a table so narrow
            """),
        new("degrees in a column of radians", "", """
            alpha (rad);cl;cd
            -10;-0,4;0,01
            0;0,1;0,009
            10;0,6;0,01

            """, """
            lab.txt:2:1: alpha is -10 rad, -572.957795131 deg; angles go from -180 to 180 degrees; if line 1 is wrong to name radians, say --angles degrees
            lab.txt:4:1: alpha is 10 rad, 572.957795131 deg; angles go from -180 to 180 degrees; if line 1 is wrong to name radians, say --angles degrees
            """),
        new("a unit said that is not the one named", "--angles radians", """
            alpha (deg);cl;cd
            -1;-0,4;0,01
            0;0,1;0,009
            1;0,6;0,01

            """, """
            lab.txt:1:1: names degrees for the angle of attack and --angles says radians; if the line is wrong, leave it out with --lines and say --columns by number
            """),
        new("angles beyond 180 degrees", "", """
            alpha cl cd
            0 0.1 0.009
            90 0.1 1.8
            350 -0.8 0.02
            400 0.1 0.009

            """, """
            lab.txt:4:1: alpha is 350; angles go from -180 to 180 degrees; where they go round from 0 to 360, say --wrap
            lab.txt:5:1: alpha is 400; angles go from -180 to 180 degrees
            """),
        new("angles beyond -180 degrees", "", """
            alpha cl cd
            -350 0.8 0.02
            -90 -0.1 1.8
            0 0.1 0.009

            """, """
            lab.txt:2:1: alpha is -350; angles go from -180 to 180 degrees; where they go round from 0 to -360, say --wrap
            """),
        new("radians to 2 pi, rounded up, that nothing says go round", "--angles radians", """
            alpha cl cd
            0 0.1 0.009
            3.1416 -0.1 0.03
            6.2832 0.1 0.009

            """, """
            lab.txt:4:1: alpha is 6.2832 rad, 360.000841837 deg; angles go from -180 to 180 degrees; where they go round from 0 to 360, say --wrap
            """),
        new("a step of radians beyond 2 pi, not the last digit of it", "--angles radians --wrap", """
            alpha cl cd
            0 0.1 0.009
            3.1 -0.1 0.03
            6.3 0.1 0.009

            """, """
            lab.txt:4:1: alpha is 6.3 rad, 360.963410932 deg; angles go from -180 to 180 degrees
            """),
        new("another unit in a row of units than in the header", "", """
            alpha (deg);cl;cd
            rad;-;-
            -10;-0,4;0,01
            0;0,1;0,009
            10;0,6;0,01

            """, """
            lab.txt:2:1: names another unit of the angle of attack than line 1; leave one of them out with --lines
            """),
        new("coefficients in counts", "--columns cd=3", """
            alpha;cl;cd x 10^4
            -5;-0,4;2
            0;0,1;1
            5;0,6;2

            """, """
            lab.txt:1:1: 'cd x 10^4' (column 3) is a multiple of the drag coefficient, and only the ratio itself is read; where its numbers are ratios all the same, leave the line of names out with --lines and say --columns by number
            """),
        new("drag in percent, in its cells", "", """
            alpha;cl;cd
            -5;-0,4;1,01%
            0;0,1;0,9 %
            5;0,6;0,01

            """, """
            lab.txt:2:9: cd is '1,01%', in percent; only ratios are read, so give the table as such
            lab.txt:3:7: cd is '0,9 %', in percent; only ratios are read, so give the table as such
            """),
        new("a degree sign beside one angle of several", "", """
            alpha;cl;cd
            -5;-0,4;0,01
            1°;0,1;0,009
            5;0,6;0,01

            """, """
            lab.txt:3:1: alpha has a degree sign here and none in line 2; give one to all angles or to none
            """),
        new("degree signs in a column of radians", "", """
            alpha [rad];cl;cd
            -3°;-0,4;0,01
            1°;0,1;0,009
            3°;0,6;0,01

            """, """
            lab.txt:2:1: alpha has a degree sign here and line 1 names radians; correct one of them
            """),
        new("degrees in a column of radians, of which some could go round", "", """
            alpha [rad];cl;cd
            -4;-0,4;0,01
            0;0,1;0,009
            4;0,6;0,01

            """, """
            lab.txt:2:1: alpha is -4 rad, -229.183118052 deg; angles go from -180 to 180 degrees; if line 1 is wrong to name radians, say --angles degrees
            lab.txt:4:1: alpha is 4 rad, 229.183118052 deg; angles go from -180 to 180 degrees; if line 1 is wrong to name radians, say --angles degrees
            """),
        new("degrees said to be radians", "--angles radians", """
            alpha;cl;cd
            -4;-0,4;0,01
            0;0,1;0,009
            3;0,6;0,01

            """, """
            lab.txt:2:1: alpha is -4 rad, -229.183118052 deg; angles go from -180 to 180 degrees; is --angles radians right?
            """),
        new("degrees said of a column of radians that may be such", "--angles degrees", """
            alpha [rad];cl;cd
            -3;-0,4;0,01
            0;0,1;0,009
            3;0,6;0,01

            """, """
            lab.txt:1:1: names radians for the angle of attack and --angles says degrees; if the line is wrong, leave it out with --lines and say --columns by number
            """),
    ];
}
