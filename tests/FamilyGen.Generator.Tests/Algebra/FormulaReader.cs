using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Tests.Algebra;

/// <summary>Reads formulas in the notation of C# into expression trees, numbering the nodes as they are completed; only for
/// tests of the algebra, which are to need no compiler.</summary>
internal sealed class FormulaReader(string text, IReadOnlyDictionary<string, Symbol> symbols)
{
    private int _at;
    private int _next;

    /// <summary>The text of each numbered node.</summary>
    public Dictionary<int, string> Sources { get; } = [];

    public Expression Read()
    {
        var result = Choice();
        Skip();
        if (_at < text.Length)
            throw new FormatException($"Unread: {text[_at..]}");
        return result;
    }

    public Condition ReadCondition() => Disjunction();

    private Expression Choice()
    {
        Skip();
        var start = _at;
        if (!IsChoice())
            return Sum();
        var condition = Disjunction();
        Expect("?");
        var whenTrue = Choice();
        Expect(":");
        return Numbered(new Conditional(condition, whenTrue, Choice()), start);
    }

    // Whether a question mark follows before this formula ends.
    private bool IsChoice()
    {
        var depth = 0;
        for (var i = _at; i < text.Length && depth >= 0; i++)
        {
            if (depth == 0 && text[i] == '?')
                return true;
            if (depth == 0 && text[i] is ',' or ':')
                return false;
            depth += text[i] == '(' ? 1 : text[i] == ')' ? -1 : 0;
        }

        return false;
    }

    private Condition Disjunction()
    {
        var left = Conjunction();
        while (Take("||"))
            left = new Or(left, Conjunction());
        return left;
    }

    private Condition Conjunction()
    {
        var left = Question();
        while (Take("&&"))
            left = new And(left, Question());
        return left;
    }

    private Condition Question()
    {
        Skip();
        var start = _at;
        if (Take("!("))
        {
            var inner = Disjunction();
            Expect(")");
            return new Not(inner);
        }

        var left = Sum();
        foreach (var sign in (string[])["<=", ">=", "==", "!=", "<", ">"])
        {
            if (!Take(sign))
                continue;
            var right = Sum();
            Condition comparison = sign switch
            {
                "<" => new Comparison(Relation.Less, left, right),
                ">" => new Comparison(Relation.Less, right, left),
                "<=" => new Comparison(Relation.LessOrEqual, left, right),
                ">=" => new Comparison(Relation.LessOrEqual, right, left),
                _ => new Comparison(Relation.Equal, left, right),
            };
            comparison = comparison with { Origin = Number(start) };
            return sign == "!=" ? new Not(comparison) { Origin = comparison.Origin } : comparison;
        }

        throw new FormatException("No comparison.");
    }

    private Expression Sum()
    {
        Skip();
        var start = _at;
        var left = Product();
        while (true)
        {
            if (Take("+"))
                left = Numbered(Formula.Sum(left, Product()), start);
            else if (Take("-"))
                left = Numbered(Formula.Sum(left, Formula.Negate(Product())), start);
            else
                return left;
        }
    }

    private Expression Product()
    {
        Skip();
        var start = _at;
        var left = Unary();
        while (true)
        {
            if (Take("*"))
            {
                left = Numbered(Formula.Product(left, Unary()), start);
            }
            else if (Take("/"))
            {
                var right = Unary();
                left = Numbered(Formula.Quotient(left, right), start);
            }
            else if (Take("%"))
            {
                left = Numbered(Formula.Call(Function.Remainder, left, Unary()), start);
            }
            else
            {
                return left;
            }
        }
    }

    private Expression Unary()
    {
        Skip();
        var start = _at;
        return Take("-") ? Numbered(Formula.Negate(Unary()), start) : Primary();
    }

    private Expression Primary()
    {
        Skip();
        var start = _at;
        if (Take("("))
        {
            var inner = Choice();
            Expect(")");
            return inner;
        }

        if (_at < text.Length && char.IsDigit(text[_at]))
        {
            while (_at < text.Length && (char.IsDigit(text[_at]) || text[_at] == '.' || (text[_at] is 'e' or 'E')))
                _at++;
            return Numbered(Formula.Of(Rational.Parse(text[start.._at])), start);
        }

        while (_at < text.Length && (char.IsLetterOrDigit(text[_at]) || text[_at] is '_' or '.'))
            _at++;
        var name = text[start.._at];
        if (name.Length == 0)
            throw new FormatException($"Nothing to read at {start} of {text}");
        if (!Take("("))
        {
            Expression atom = name switch
            {
                "PI" => new Constant(Math.PI, "Math.PI"),
                "E" => new Constant(Math.E, "Math.E"),
                "double.NegativeInfinity" => new Constant(double.NegativeInfinity, name),
                _ => symbols[name],
            };
            return Numbered(atom, start);
        }

        var arguments = new List<Expression> { Choice() };
        while (Take(","))
            arguments.Add(Choice());
        Expect(")");
        return Numbered(Call(name, arguments), start);
    }

    private static Expression Call(string name, List<Expression> a) => name switch
    {
        "Pow" => new Power(a[0], a[1]),
        "Sqrt" => new Power(a[0], Formula.Of(new Rational(1, 2))),
        "FactorialLn" => Formula.Call(Function.LogGamma, Formula.Sum(a[0], Formula.One)),
        "GammaLn" => Formula.Call(Function.LogGamma, a[0]),
        "BinomialLn" => Formula.Sum(
            Call("FactorialLn", [a[0]]), Formula.Negate(Call("FactorialLn", [a[1]])), Formula.Negate(Call("FactorialLn", [Formula.Difference(a[0], a[1])]))),
        "DiGamma" => Formula.Call(Function.Digamma, a[0]),
        "Div" => Formula.Call(Function.IntegerQuotient, [.. a]),
        _ when Enum.TryParse<Function>(name, out var function) => Formula.Call(function, [.. a]),
        _ => new Opaque(name, a.ToEquatableArray()),
    };

    private Expression Numbered(Expression expression, int start) => expression with { Origin = Number(start) };

    private int Number(int start)
    {
        Sources[_next] = text[start.._at].Trim();
        return _next++;
    }

    private bool Take(string sign)
    {
        Skip();
        if (!text.AsSpan(_at).StartsWith(sign, StringComparison.Ordinal))
            return false;
        if (sign is "<" or ">" && _at + 1 < text.Length && text[_at + 1] == '=')
            return false;
        _at += sign.Length;
        return true;
    }

    private void Expect(string sign)
    {
        if (!Take(sign))
            throw new FormatException($"'{sign}' expected at {_at} of {text}");
    }

    private void Skip()
    {
        while (_at < text.Length && char.IsWhiteSpace(text[_at]))
            _at++;
    }
}
