using System.Text;

namespace RebuildPlanner.Sheets.Pages;

/// <summary>A sheet as plain text: what it says, block by block, for comparing and for reading where no page can be shown.</summary>
public static class SheetText
{
    /// <summary>The text.</summary>
    public static string Of(Sheet sheet)
    {
        StringBuilder text = new();
        text.AppendLine(sheet.Title).AppendLine($"{sheet.Author} | {sheet.Subject} | {sheet.Date:yyyy-MM-dd} | {sheet.Paper.Word}");
        foreach (Block block in sheet.Blocks)
        {
            Write(text, block);
        }

        return text.Append('\n').Append(sheet.Foot).Append('\n').ToString().ReplaceLineEndings("\n");
    }

    private static void Write(StringBuilder text, Block block)
    {
        switch (block)
        {
            case Heading heading:
                text.Append('\n').Append('#', heading.Level).Append(' ').AppendLine(heading.Text);
                break;
            case Paragraph paragraph:
                text.AppendLine(paragraph.Style == Style.Body ? paragraph.Text : $"[{paragraph.Style.ToString().ToLowerInvariant()}] {paragraph.Text}");
                break;
            case Points points:
                text.AppendJoin('\n', points.Items.Select(item => $"- {item}")).Append('\n');
                break;
            case Facts facts:
                text.AppendJoin('\n', facts.Pairs.Select(pair => $"{pair.Name}: {pair.Value}")).Append('\n');
                break;
            case Table table:
                text.AppendLine(string.Join(" | ", table.Columns.Select(column => column.Title)));
                text.AppendJoin('\n', table.Rows.Select(row => string.Join(" | ", row))).Append('\n');
                break;
            case Illustration figure:
                text.AppendLine($"[figure] {figure.Picture.Title}: {figure.Picture.Alternative}").AppendLine($"[caption] {figure.Caption}");
                break;
            case Framed framed:
                text.AppendLine("[frame");
                WriteAll(text, framed.Blocks);
                text.AppendLine("]");
                break;
            case Together together:
                WriteAll(text, together.Blocks);
                break;
            case Signatures signatures:
                text.AppendJoin('\n', signatures.Labels.Select(label => $"________ {label}")).Append('\n');
                break;
            case NewPage:
                text.AppendLine("[new page]");
                break;
        }
    }

    private static void WriteAll(StringBuilder text, IReadOnlyList<Block> blocks)
    {
        foreach (Block block in blocks)
        {
            Write(text, block);
        }
    }
}
