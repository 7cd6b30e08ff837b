using System.Text;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Paths;

/// <summary>
/// Splits UTF-8 text into rows of cells after RFC 4180, comma only, without copying. Lines end with CRLF, LF or CR. Blank lines and lines that
/// begin with # are passed over.
/// </summary>
internal sealed class CsvRows(byte[] utf8)
{
    private int _at;
    private int _line = 1;
    private int _lineStart;

    /// <summary>Cells of the current row; reused from row to row.</summary>
    public List<CsvCell> Cells { get; } = [];

    /// <summary>Line of the current row, from 1.</summary>
    public int Line { get; private set; }

    /// <summary>First byte of the current row.</summary>
    public int Start { get; private set; }

    /// <summary>What went wrong in the current row's quoting; null when nothing did.</summary>
    public (CsvCell Cell, string Message, string Expected)? Fault { get; private set; }

    /// <summary>A quote was opened and the file ended before it closed: nothing after it can be trusted.</summary>
    public bool Unclosed { get; private set; }

    /// <summary>Goes to the next row; false at the end.</summary>
    public bool Next()
    {
        Cells.Clear();
        Fault = null;
        while (_at < utf8.Length)
        {
            if (utf8[_at] == (byte)'#')
            {
                var left = utf8.AsSpan(_at).IndexOfAny((byte)'\n', (byte)'\r');
                _at = left < 0 ? utf8.Length : _at + left;
            }

            if (_at < utf8.Length && utf8[_at] is (byte)'\n' or (byte)'\r')
            {
                EndLine();
            }
            else
            {
                break;
            }
        }

        if (_at >= utf8.Length)
        {
            return false;
        }

        (Line, Start) = (_line, _at);
        while (!ReadCell())
        {
        }

        return true;
    }

    /// <summary>Reads again the row that starts at a byte, for messages about earlier rows.</summary>
    public static CsvRows At(byte[] utf8, int start, int line)
    {
        var rows = new CsvRows(utf8) { _at = start, _line = line, _lineStart = start };
        rows.Next();
        return rows;
    }

    public ReadOnlySpan<byte> Bytes(CsvCell cell) => utf8.AsSpan(cell.Start, cell.Length);

    /// <summary>The cell's text with doubled quotes resolved.</summary>
    public string Text(CsvCell cell)
    {
        var text = Encoding.UTF8.GetString(Bytes(cell));
        return cell.Quoted ? text.Replace("\"\"", "\"", StringComparison.Ordinal) : text;
    }

    /// <summary>As much of the cell as a message shows.</summary>
    public string Shown(CsvCell cell) =>
        Encoding.UTF8.GetString(Bytes(cell)[..Math.Min(cell.Length, 4 * (VisibleText.DefaultLength + 1))]);

    public int ColumnOf(CsvCell cell) => 1 + Encoding.UTF8.GetCharCount(utf8, cell.LineStart, cell.At - cell.LineStart);

    // Reads one cell and what follows it; true at the end of the row.
    private bool ReadCell()
    {
        var (line, lineStart, at) = (_line, _lineStart, _at);
        if (_at < utf8.Length && utf8[_at] == (byte)'"')
        {
            var closed = SkipQuoted();
            var cell = new CsvCell(at + 1, Math.Max(0, _at - at - (closed ? 2 : 1)), true, line, lineStart, at);
            Cells.Add(cell);
            if (!closed)
            {
                Unclosed = true;
                Fault ??= (cell, "A quote is opened and never closed.", "a closing quote");
                return true;
            }

            SkipBlanks();
            if (_at < utf8.Length && utf8[_at] is not ((byte)',' or (byte)'\n' or (byte)'\r'))
            {
                Fault ??= (cell, "Text follows a closing quote.", "a comma or the end of the line; a quote inside quotes is written twice");
                SkipPlain();
            }
        }
        else
        {
            SkipPlain();
            var content = utf8.AsSpan(at, _at - at);
            var lead = content.IndexOfAnyExcept((byte)' ', (byte)'\t');
            var trimmed = lead < 0 ? default : content[lead..].TrimEnd(" \t"u8);
            var start = lead < 0 ? _at : at + lead;
            var cell = new CsvCell(start, trimmed.Length, false, line, lineStart, start);
            Cells.Add(cell);
            if (trimmed.Contains((byte)'"'))
            {
                Fault ??= (cell, "A quote stands inside a cell that does not begin with one.", "the whole cell in quotes, and quotes inside written twice");
            }
        }

        if (_at < utf8.Length && utf8[_at] == (byte)',')
        {
            _at++;
            return false;
        }

        if (_at < utf8.Length)
        {
            EndLine();
        }

        return true;
    }

    private void SkipPlain()
    {
        var left = utf8.AsSpan(_at).IndexOfAny((byte)',', (byte)'\n', (byte)'\r');
        _at = left < 0 ? utf8.Length : _at + left;
    }

    private void SkipBlanks()
    {
        while (_at < utf8.Length && utf8[_at] is (byte)' ' or (byte)'\t')
        {
            _at++;
        }
    }

    // From an opening quote past its closing one; false when there is none.
    private bool SkipQuoted()
    {
        _at++;
        while (_at < utf8.Length)
        {
            switch (utf8[_at])
            {
                case (byte)'"' when _at + 1 < utf8.Length && utf8[_at + 1] == (byte)'"':
                    _at += 2;
                    break;
                case (byte)'"':
                    _at++;
                    return true;
                case (byte)'\n' or (byte)'\r':
                    EndLine();
                    break;
                default:
                    _at++;
                    break;
            }
        }

        return false;
    }

    private void EndLine()
    {
        _at += utf8[_at] == (byte)'\r' && _at + 1 < utf8.Length && utf8[_at + 1] == (byte)'\n' ? 2 : 1;
        _line++;
        _lineStart = _at;
    }
}
