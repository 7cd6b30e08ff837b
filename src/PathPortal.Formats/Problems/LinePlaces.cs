using System.Text;

namespace PathPortal.Formats.Problems;

/// <summary>Turns byte offsets of UTF-8 text into lines and columns (UTF-16 units), both from 1. Lines end at LF.</summary>
internal sealed class LinePlaces
{
    private readonly byte[] _utf8;
    private readonly List<int> _starts = [0];

    public LinePlaces(byte[] utf8)
    {
        _utf8 = utf8;
        for (var i = 0; i < utf8.Length; i++)
        {
            if (utf8[i] == (byte)'\n')
            {
                _starts.Add(i + 1);
            }
        }
    }

    public (int Line, int Column) At(long offset)
    {
        var at = (int)Math.Clamp(offset, 0, _utf8.Length);
        var index = _starts.BinarySearch(at);
        var line = index >= 0 ? index : ~index - 1;
        return (line + 1, 1 + Encoding.UTF8.GetCharCount(_utf8, _starts[line], at - _starts[line]));
    }
}
