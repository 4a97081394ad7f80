namespace BladeLoads.Studies.Tests.Laboratory;

/// <summary>Tables that cannot be read, or can be read in two ways, invented here, with the whole text of the refusal.</summary>
internal static partial class TablesThatAreRefused
{
    private static readonly ForeignCase[] Order =
    [
        new("up and down", "", """
            alpha cl cd
            0 0.1 0.009
            10 0.9 0.02
            20 1.0 0.05
            10 0.6 0.04
            0 0.1 0.009

            """, """
            lab.txt:4:1: angles rise from 0 to 20 (lines 2 to 4) and then fall from 20 to 0 (lines 4 to 6): two sweeps over the same range, or rows out of order; say which count with --sweep rising, falling, mean or all, or choose rows with --lines
            """),
        new("no mean of sweeps over other angles", "--sweep mean", """
            alpha cl cd
            0 0.1 0.009
            10 0.9 0.02
            20 1.0 0.05
            11 0.6 0.04
            0 0.1 0.009

            """, """
            lab.txt:3:1: alpha 10 is in one of the two sweeps only, so that there is no mean; choose rows with --lines, or one sweep
            lab.txt:5:1: alpha 11 is in one of the two sweeps only, so that there is no mean; choose rows with --lines, or one sweep
            """),
        new("no mean of three sweeps", "--sweep mean", """
            alpha cl cd
            0 0.1 0.009
            10 0.9 0.02
            20 1.0 0.05
            10 0.6 0.04
            0 0.11 0.009
            10 0.92 0.02
            20 1.02 0.05

            """, """
            lab.txt:2: --sweep mean takes two sweeps, one of rising and one of falling angles, and there are others; choose rows with --lines
            """),
        new("no mean of two rising sweeps", "--sweep mean", """
            alpha cl cd
            0 0.1 0.009
            10 0.9 0.02
            0 0.2 0.009
            10 0.8 0.02

            """, """
            lab.txt:2: --sweep mean takes two sweeps, one of rising and one of falling angles, and there are others; choose rows with --lines
            """),
        new("one angle, two values, about a row that is there twice", "--sweep mean", """
            alpha cl cd
            0 0.1 0.009
            10 0.9 0.02
            0 0.1 0.009
            10 0.8 0.02

            """, """
            lab.txt:5:1: alpha 10 has cl 0.8 cd 0.02 here and cl 0.9 cd 0.02 in line 3; which is meant cannot be told, keep one
            """),
        new("two rising sweeps", "--sweep rising", """
            alpha cl cd
            0 0.1 0.009
            10 0.9 0.02
            0 0.2 0.009
            10 0.8 0.02

            """, """
            lab.txt:2: has more than one sweep of rising angles over the same range; choose rows with --lines, or take all with --sweep all
            """),
        new("no falling sweep", "--sweep falling", """
            alpha cl cd
            0 0.1 0.009
            10 0.9 0.02
            5 0.2 0.009
            15 0.8 0.02

            """, """
            lab.txt:2: has no sweep of falling angles over the same range; choose rows with --lines, or take all with --sweep all
            """),
        new("a row out of order", "", """
            alpha cl cd
            0 0.1 0.009
            10 0.9 0.02
            5 0.5 0.01
            20 1.0 0.05

            """, """
            lab.txt:4:1: angles rise from 0 to 10 (lines 2 to 3) and then rise from 5 to 20 (lines 4 to 5): two sweeps over the same range, or rows out of order; say which count with --sweep rising, falling, mean or all, or choose rows with --lines
            """),
        new("one angle, two values", "", """
            alpha cl cd cm
            0 0.1 0.009 -0.1
            10 0.9 0.02 -0.1
            10 0.91 0.02 -0.1
            20 1.0 0.05 -0.1

            """, """
            lab.txt:4:1: alpha 10 has cl 0.91 cd 0.02 cm -0.1 here and cl 0.9 cd 0.02 cm -0.1 in line 3; which is meant cannot be told, keep one
            """),
        new("one angle but for its last digits, two values", "", """
            alpha cl cd
            0 0.1 0.009
            2 0.3 0.01
            2.0000001 0.4 0.01
            10 0.91 0.02

            """, """
            lab.txt:4:1: alpha 2.0000001 has cl 0.4 cd 0.01 here and alpha 2, within 1e-5 degrees of it, has cl 0.3 cd 0.01 in line 3; which is meant cannot be told, keep one
            """),
        new("the turn of two sweeps measured three times", "--sweep mean", """
            alpha cl cd
            0 0.1 0.009
            10 0.9 0.02
            14 1.3 0.05
            14 1.2 0.05
            14 1.1 0.05
            10 0.6 0.04
            0 0.1 0.009

            """, """
            lab.txt:5:1: alpha 14 has cl 1.2 cd 0.05 here and cl 1.3 cd 0.05 in line 4; which is meant cannot be told, keep one
            lab.txt:6:1: alpha 14 has cl 1.1 cd 0.05 here and cl 1.2 cd 0.05 in line 5; which is meant cannot be told, keep one
            """),
        new("two sweeps of other values, taken together", "--sweep all", """
            alpha cl cd
            0 0.1 0.009
            2 0.3 0.01
            4 0.5 0.011
            6 0.7 0.012
            8 0.8 0.02
            6 0.6 0.013
            4 0.4 0.012
            2 0.2 0.011
            0 0 0.01

            """, """
            lab.txt:7:1: alpha 6 has cl 0.6 cd 0.013 here and cl 0.7 cd 0.012 in line 5; which is meant cannot be told, keep one
            lab.txt:8:1: alpha 4 has cl 0.4 cd 0.012 here and cl 0.5 cd 0.011 in line 4; which is meant cannot be told, keep one
            lab.txt:9:1: alpha 2 has cl 0.2 cd 0.011 here and cl 0.3 cd 0.01 in line 3; which is meant cannot be told, keep one
            lab.txt:10:1: and 1 more like it
            """),
        new("words between rows", "", """
            alpha cl cd
            0 0.1 0.009
            10 0.9 0.02
            fixed transition
            15 0.8 0.03
            20 1.0 0.05

            """, """
            lab.txt:4:1: 'fixed transition' stands between rows, and what it says of those below is not known; put a comment mark before it, say with --comment how it begins, or choose rows with --lines
            """),
        new("other columns further down", "", """
            alpha;cl;cd
            -5;-0,4;0,01
            0;0,1;0,009
            5;0,6;0,01
            alpha;cd;cl
            -5;0,01;-0,4
            0;0,009;0,1
            5;0,01;0,6

            """, """
            lab.txt:5:1: names other columns than line 1; --lines says which lines hold the table
            """),
        new("rows above the header", "", """
            -5;-0,4;0,01
            0;0,1;0,009
            alpha;cl;cd
            -10;-0,4;0,01
            -7;0,1;0,009
            15;0,6;0,01

            """, """
            lab.txt:1:1: holds a row above the line that names the columns; --lines says which lines hold the table
            lab.txt:2:1: holds a row above the line that names the columns; --lines says which lines hold the table
            """),
        new("a header of another length than the rows", "", """
            alpha;cl;cd;cm
            -5;-0,4;0,01
            0;0,1;0,009
            5;0,6;0,01

            """, """
            lab.txt:1:1: names 4 columns where line 2 has 3 values; say which are which by number: --columns alpha=1,cl=2,cd=3
            """),
        new("a footer that may be a row", "", """
            alpha cl cd
            -5 -0.4 0.01
            0 0.1 0.009
            5 0.6 0.01
            max 0.6 0.01

            """, """
            lab.txt:5:1: alpha is 'max'; give a number
            """),
    ];
}
