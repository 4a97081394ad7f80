namespace BladeLoads.Results.Report;

/// <summary>The look of the page, on a screen and on A4.</summary>
internal static class ReportStyle
{
    public const string Text = """

        body { font: 14px/1.45 'DejaVu Sans', Verdana, sans-serif; color: #202020; max-width: 1180px; margin: 24px auto; padding: 0 16px; }
        h1 { font-size: 24px; margin: 0 0 4px; }
        h2 { font-size: 17px; margin: 28px 0 8px; border-bottom: 1px solid #b0b0b0; }
        h3 { font-size: 14px; margin: 16px 0 4px; }
        table { border-collapse: collapse; font-size: 12px; margin: 6px 0; }
        th, td { border: 1px solid #d0d0d0; padding: 2px 6px; text-align: left; vertical-align: top; overflow-wrap: anywhere; }
        th { background: #f1f3f5; font-weight: 600; overflow-wrap: normal; }
        td:first-child { min-width: 16em; }
        td:first-child, th { hyphens: none; }
        .figures td:last-child { min-width: 9em; }
        .cases td:nth-child(2) { min-width: 16em; }
        .n { text-align: right; font-variant-numeric: tabular-nums; overflow-wrap: normal; }
        .origin, footer { color: #505050; }
        .caution { border: 2px solid #b04000; padding: 0 14px 4px; margin-top: 16px; }
        .caution h2 { border: 0; margin-top: 10px; }
        .sign table { width: 100%; }
        .sign td { height: 30px; width: 26%; }
        .sign td:first-child { width: 14%; min-width: 0; }
        .receipt td { font-size: 11px; }
        figure { margin: 12px 0 20px; break-inside: avoid; }
        figcaption { font-weight: 600; margin-bottom: 4px; }
        img { width: 100%; max-width: 794px; height: auto; }
        footer { margin: 28px 0; }
        @page { size: A4 landscape; margin: 12mm; }
        @media print { body { margin: 0; max-width: none; padding: 0; font-size: 10pt; } table { font-size: 7.5pt; } tr, .receipt { break-inside: avoid; } }

        """;
}
