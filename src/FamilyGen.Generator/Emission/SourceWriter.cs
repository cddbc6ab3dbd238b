using System.Text;

namespace FamilyGen.Generator.Emission;

/// <summary>Lines of C# with the indentation of their block.</summary>
internal sealed class SourceWriter
{
    private readonly StringBuilder _text = new();
    private int _depth;

    public void Line(string text = "")
    {
        foreach (var line in text.Split('\n'))
        {
            if (line.Length > 0)
                _text.Append(' ', 4 * _depth).Append(line);
            _text.Append('\n');
        }
    }

    public void Open(string head)
    {
        Line(head);
        Line("{");
        _depth++;
    }

    public void Close(string tail = "")
    {
        // No blank line before a closing brace.
        while (_text.Length > 1 && _text[_text.Length - 1] == '\n' && _text[_text.Length - 2] == '\n')
            _text.Length--;
        _depth--;
        Line("}" + tail);
    }

    public void Indented(string text)
    {
        _depth++;
        Line(text);
        _depth--;
    }

    public override string ToString() => _text.ToString();
}
