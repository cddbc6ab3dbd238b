using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>Whether observations in a range can occur.</summary>
internal enum Presence
{
    /// <summary>None of them can.</summary>
    Out,

    /// <summary>Some may.</summary>
    Unknown,

    /// <summary>All of them can.</summary>
    In,
}

/// <summary>The part of the declared support where the base measure is positive.</summary>
internal sealed class EffectiveSupport
{
    private readonly SupportDeclaration _support;
    private readonly EnclosingEvaluator _evaluator;
    private readonly Expression _base;
    private readonly bool _isLogarithm;

    private EffectiveSupport(SupportDeclaration support, Expression measure, bool isLogarithm, bool ignoresPoints)
    {
        _support = support;
        _evaluator = new EnclosingEvaluator(support.IsLattice) { IgnoresPoints = ignoresPoints };
        _isLogarithm = isLogarithm;
        _base = measure;
        Lower = Number(_support.Lower);
        Upper = Number(_support.Upper);
        Masses = _support.Masses.Select(Number).OfType<Rational>().ToList();
    }

    /// <summary>Where the base measure is positive; single points of an interval may be left out of account.</summary>
    public static EffectiveSupport Of(FamilyDeclaration declaration, NormalForm form, bool ignoresPoints = false) => new(
        declaration.Support,
        declaration.BaseMeasure?.Body ?? (form.LogBase.Terms.Count == 0 ? Formula.Zero : form.LogBase.ToExpression()),
        declaration.BaseMeasure?.IsLogarithm ?? true,
        ignoresPoints);

    /// <summary>Where the declared measure, or the kernel whatever its parameters, leaves anything to observe; before there is
    /// a normal form.</summary>
    public static EffectiveSupport OfDeclared(FamilyDeclaration declaration) => new(
        declaration.Support,
        declaration.BaseMeasure?.Body ?? declaration.Kernel ?? Formula.Zero,
        declaration.BaseMeasure?.IsLogarithm ?? true,
        ignoresPoints: true);

    /// <summary>The support as it is declared, whatever the base measure.</summary>
    public static EffectiveSupport Declared(FamilyDeclaration declaration) => new(declaration.Support, Formula.Zero, true, false);

    /// <summary>The ends where they are finite numbers.</summary>
    public Rational? Lower { get; }

    public Rational? Upper { get; }

    /// <summary>The points with a probability of their own, as far as they are numbers.</summary>
    public IReadOnlyList<Rational> Masses { get; }

    public bool IsLattice => _support.IsLattice;

    /// <summary>Whether both ends are known at compile time.</summary>
    public bool IsNumeric => (Lower is null) == (_support.Lower is null) && (Upper is null) == (_support.Upper is null);

    public bool LowerIncluded => _support.LowerIncluded || IsLattice;

    public bool UpperIncluded => _support.UpperIncluded || IsLattice;

    public EnclosingEvaluator Evaluator => _evaluator;

    /// <summary>The measure or its logarithm, over a range.</summary>
    public Enclosure Base(Enclosure x) => _evaluator.Of(_base, x);

    /// <summary>Whether the declared range, its condition apart, certainly has the point.</summary>
    public bool InRange(Rational x)
    {
        if (Masses.Contains(x))
            return true;
        if (IsLattice && !x.IsInteger)
            return false;
        var above = Lower is { } lower ? x > lower || (x == lower && LowerIncluded) : _support.Lower is null;
        var below = Upper is { } upper ? x < upper || (x == upper && UpperIncluded) : _support.Upper is null;

        // A support that is not empty has the end that is included, wherever the other end lies.
        var atEnd = (x == Lower && LowerIncluded && Upper is null) || (x == Upper && UpperIncluded && Lower is null);
        return atEnd || (above && below);
    }

    /// <summary>Whether the condition of the support allows a range of observations.</summary>
    public bool? Allowed(Enclosure x) => _support.Predicate is { } predicate ? _evaluator.Holds(predicate, x) : true;

    public Presence At(Rational x) => InRange(x) ? In(Enclosure.Of(x)) : Presence.Out;

    /// <summary>For a range inside the declared one.</summary>
    public Presence In(Enclosure x)
    {
        var allowed = Allowed(x);
        if (allowed == false)
            return Presence.Out;
        var measure = Base(x);
        if (_isLogarithm ? measure.IsNegativeInfinity : measure.IsZero)
            return Presence.Out;
        var positive = _isLogarithm ? measure.IsFinite : measure.IsPositive && measure.IsFinite;
        return positive && allowed == true ? Presence.In : Presence.Unknown;
    }

    private static Rational? Number(Expression? end)
    {
        if (end is null || Dependences.Of(end) != Dependence.None || Dependences.Parts(end).Any(p => p is Opaque))
            return null;
        if (new EnclosingEvaluator(false).Of(end, Enclosure.Zero).Exact is { } exact)
            return exact;
        var value = Algebra.Evaluator.Evaluate(end, _ => double.NaN);
        return double.IsNaN(value) || double.IsInfinity(value) ? null : Doubles.ToRational(value);
    }
}
