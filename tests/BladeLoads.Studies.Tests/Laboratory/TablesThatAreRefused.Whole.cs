namespace BladeLoads.Studies.Tests.Laboratory;

/// <summary>Tables that cannot be read, or can be read in two ways, invented here, with the whole text of the refusal.</summary>
internal static partial class TablesThatAreRefused
{
    private static readonly ForeignCase[] Whole =
    [
        new("two sections", "", """
            section alpha cl cd
            A 0 0.1 0.009
            A 5 0.1 0.009
            B 10 0.9 0.02
            B 20 1.0 0.05

            """, """
            lab.txt:4:1: has rows of sections A, B; say which: --section A
            """),
        new("a section that is not there", "--section C", """
            section alpha cl cd
            A 0 0.1 0.009
            A 5 0.1 0.009
            B 10 0.9 0.02

            """, """
            lab.txt: has no section 'C'; there are A, B
            """),
        new("a section where no column names any", "--section C", """
            alpha cl cd
            0 0.1 0.009
            5 0.1 0.009
            10 0.9 0.02

            """, """
            lab.txt: no column names sections, so there is no section 'C'
            """),
        new("two ways to separate columns", "--columns alpha=2,cl=3,cd=4", """
            <TAB>-5<TAB>-0.4<TAB>0.1<TAB>0.7
            <TAB>0<TAB>0.1<TAB>0.9<TAB>0.7
            <TAB>5<TAB>0.6<TAB>0.1<TAB>0.7

            """, """
            lab.txt:1:1: can be read in two ways: with tabs between columns and a decimal point, -5 -0.4 0.1 in line 1; or with blanks between columns and a decimal point, -0.4 0.1 0.7 in line 1; say which with --separator and --decimal
            """),
        new("commas that are to separate columns and be decimal signs", "--separator comma --decimal comma", """
            alpha,cl,cd
            0,1,2
            5,1,2
            10,1,2

            """, """
            lab.txt: a comma cannot both separate columns and be the decimal sign where no cell stands in quotes; give --separator or --decimal another
            """),
        new("a hidden character", "", """
            alpha;cl;cd
            <U+200F>-5;-0,4;0,01
            0;0,<U+200B>1;0,009
            5;0,6;0,01

            """, """
            lab.txt:2:1: alpha is '\u200F-5', with a hidden character in it; take that out
            lab.txt:3:3: cl is '0,\u200B1', with a hidden character in it; take that out
            """),
        new("a control character", "", """
            alpha;cl;cd
            -5;<U+001B>[2J;0,01
            0;0,1;0,009
            5;0,6;0,01

            """, """
            lab.txt:2:4: holds a control character (U+001B), as no text does; give the table as a text file
            """),
        new("two rows", "", """
            alpha cl cd
            0 0.1 0.009
            10 0.9 0.02

            """, """
            lab.txt:2: has 2 rows; a polar needs three or more
            """),
        new("a header alone", "", """
            alpha cl cd

            """, """
            lab.txt: holds no table: no line has two numbers or more in columns of their own
            """),
        new("prose alone", "", """
            We are sorry that the table
            could not be attached.

            """, """
            lab.txt: holds no table: no line has two numbers or more in columns of their own
            """),
        new("markup", "", """
            <html><body><table>
            <tr><td>0</td><td>0.1</td><td>0.009</td></tr>
            </table></body></html>

            """, """
            lab.txt: holds no table: no line has two numbers or more in columns of their own
            """),
        new("lines where there is nothing", "--lines 90-99", """
            alpha cl cd
            0 0.1 0.009
            10 0.9 0.02
            20 1.0 0.05

            """, """
            lab.txt: holds no table: no line has two numbers or more in columns of their own
            """),
    ];
}
