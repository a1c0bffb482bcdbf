using System.Text;

namespace FrameGen.Formats.Dxf;

/// <summary>Turns any text into one line that a DXF reader prints as it stands.</summary>
/// <remarks>
/// DXF has codes inside text: <c>%%d</c> and the like, <c>^</c> before control characters, <c>\U+XXXX</c> and <c>\M+nXXXX</c> for
/// characters outside ASCII. Two percent signs in a row can't be written in a way that all readers print alike, so a space parts them.
/// </remarks>
internal static class DxfText
{
    /// <summary>The text in DXF's codes, ASCII only.</summary>
    public static string Encode(string text)
    {
        if (IsPlain(text))
        {
            return text;
        }

        var coded = new StringBuilder(text.Length + 16);
        for (int i = 0; i < text.Length; i++)
        {
            char c = text[i];
            switch (c)
            {
                case '^':
                    coded.Append("^ ");
                    break;
                case '%' when i > 0 && text[i - 1] == '%':
                    coded.Append(" %");
                    break;
                case '\\' when i + 2 < text.Length && text[i + 2] == '+' && text[i + 1] is 'U' or 'u' or 'M' or 'm':
                    coded.Append("\\U+005C");
                    break;
                case '\r' when i + 1 < text.Length && text[i + 1] == '\n':
                    break;
                case '\n' or '\r' or '\t' or '\u0085' or '\u2028' or '\u2029':
                    coded.Append(' ');
                    break;
                case >= ' ' and <= '~':
                    coded.Append(c);
                    break;
                case < ' ' or (>= '\u007F' and <= '\u009F'):
                    coded.Append('?');
                    break;
                case var _ when char.IsSurrogate(c):
                    // DXF's code holds four digits: characters beyond them have no place in it.
                    coded.Append(char.IsLowSurrogate(c) && i > 0 && char.IsHighSurrogate(text[i - 1]) ? string.Empty : "?");
                    break;
                default:
                    coded.Append("\\U+").Append(((int)c).ToString("X4", System.Globalization.CultureInfo.InvariantCulture));
                    break;
            }
        }

        return coded.ToString();
    }

    private static bool IsPlain(string text)
    {
        foreach (char c in text)
        {
            if (c is (not (>= ' ' and <= '~')) or '^' or '%' or '\\')
            {
                return false;
            }
        }

        return true;
    }
}
