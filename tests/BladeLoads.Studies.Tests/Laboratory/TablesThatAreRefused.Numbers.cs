namespace BladeLoads.Studies.Tests.Laboratory;

/// <summary>Tables that cannot be read, or can be read in two ways, invented here, with the whole text of the refusal.</summary>
internal static partial class TablesThatAreRefused
{
    private static readonly ForeignCase[] Numbers =
    [
        new("decimal commas between commas", "", """
            alpha,cl,cd
            -5,-0,4,0,01
            0,0,1,0,009
            5,0,6,0,01

            """, """
            lab.txt:1:1: names 3 columns where line 2 has 5 values; commas seem to separate columns and to be decimal signs too, so save the table with semicolons
            """),
        new("whole numbers between commas", "", """
            alpha,cl,cd
            -10,0,1
            0,1,0
            10,1,1

            """, """
            lab.txt:2:1: commas stand here and no row has a decimal point, so that they may separate columns or be decimal signs; say --decimal point where they separate, or save the table with semicolons
            """),
        new("whole numbers between commas, a decimal point behind a comment mark alone", "", """
            alpha,cl,cd
            -10,0,1
            0,1,0
            10,1,1
            # 20,0.5,1

            """, """
            lab.txt:2:1: commas stand here and no row has a decimal point, so that they may separate columns or be decimal signs; say --decimal point where they separate, or save the table with semicolons
            """),
        new("one decimal point among commas", "", """
            alpha;cl;cd
            -5;-0,4;0,01
            0;0.1;0,009
            5;0,6;0,01

            """, """
            lab.txt:3:3: cl is '0.1', with a point where other numbers have a decimal comma
            """),
        new("rows too short, empty, not finite, not a number", "", """
            alpha;cl;cd
            -5;-0,4;0,01
            0;0,1
            5;0,6;0,01
            7;;0,01
            8;0,6;NaN
            9;x;0,01

            """, """
            lab.txt:3:1: 2 values where line 1 names 3; give one a column, or leave the line out by --lines or a comment mark
            lab.txt:5:3: cl is empty; give a number, or leave such rows out with --leave-out incomplete
            lab.txt:6:7: cd is 'NaN', no number; leave such rows out with --leave-out incomplete
            lab.txt:7:3: cl is 'x'; give a number
            """),
        new("formulas, and numbers that are none", "", """
            alpha;cl;cd
            -5;=1+1;0,01
            0;1e400;0,009
            5;1e-400;0,01
            6;inf;001
            7;0,9 3;0,01
            8;--0,9;0,01

            """, """
            lab.txt:2:4: cl is '=1+1', a formula; give its value
            lab.txt:3:3: cl is '1e400', beyond all numbers that can be kept
            lab.txt:4:3: cl is '1e-400', too small a number to be kept
            lab.txt:5:3: cl is 'inf', no number; leave such rows out with --leave-out incomplete
            lab.txt:5:7: cd is '001'; a whole number that begins with 0 has lost its decimal sign, it seems
            lab.txt:6:3: cl is '0,9 3'; give a number
            lab.txt:7:3: cl is '--0,9'; give a number
            """),
        new("drag below 0", "", """
            alpha cl cd
            0 0.1 -0.0003
            10 0.9 0.02
            15 0.8 0.03
            20 1.0 0.05

            """, """
            lab.txt:2:7: cd is -0.0003; drag coefficients must be >= 0, leave such rows out with --leave-out negative-drag
            """),
        new("lift and drag exchanged", "", """
            alpha cd cl
            -10 -0.9 0.02
            -5 -0.4 0.01
            -3 -0.2 0.01
            -2 -0.1 0.01
            0 0.1 0.01
            10 0.9 0.02

            """, """
            lab.txt:2:5: cd is -0.9; drag coefficients must be >= 0, leave such rows out with --leave-out negative-drag
            lab.txt:3:4: cd is -0.4; drag coefficients must be >= 0, leave such rows out with --leave-out negative-drag
            lab.txt:4:4: cd is -0.2; drag coefficients must be >= 0, leave such rows out with --leave-out negative-drag
            lab.txt:5:4: and 1 more like it in column cd; are cl and cd exchanged?
            """),
        new("numbers that have lost their decimal sign", "", """
            alpha cl cd
            -5 -04 001
            0 01 9
            5 60 2

            """, """
            lab.txt:2:4: cl is '-04'; a whole number that begins with 0 has lost its decimal sign, it seems
            lab.txt:2:8: cd is '001'; a whole number that begins with 0 has lost its decimal sign, it seems
            lab.txt:3:3: cl is '01'; a whole number that begins with 0 has lost its decimal sign, it seems
            lab.txt:4:3: cl is 60, and no section has a coefficient beyond 20; a decimal sign, a unit or a column is wrong
            """),
        new("a spreadsheet's error at the beginning of a line", "", """
            alpha,cl,cd
            -5,-0.4,0.01
            #N/A,0.1,0.009
            5,0.6,0.01
            10,#DIV/0!,0.02

            """, """
            lab.txt:3:1: alpha is '#N/A', no number; leave such rows out with --leave-out incomplete
            lab.txt:5:4: cl is '#DIV/0!', no number; leave such rows out with --leave-out incomplete
            """),
        new("a moment that is missing somewhere", "", """
            alpha,cl,cd,cm
            -5,-0.4,0.01,-0.1
            0,0.1,0.009,
            5,0.6,0.01,-0.1

            """, """
            lab.txt:3:13: cm is empty; give a number, or leave such rows out with --leave-out incomplete
            """),
        new("a quote that nothing closes", "", """
            alpha;cl;cd
            -5;"-0,4;0,01
            0;0,1;0,009
            5;0,6;0,01

            """, """
            lab.txt:2:4: cl is '"-0,4'; give a number
            """),
    ];
}
