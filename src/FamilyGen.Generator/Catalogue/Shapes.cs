using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Catalogue;

/// <summary>The functions of the canonical coordinate y in which entries on the line are stated.</summary>
internal enum ShapeKind
{
    /// <summary>y.</summary>
    Linear,

    /// <summary>y².</summary>
    Square,

    /// <summary>e^(ky).</summary>
    Exponential,

    /// <summary>log(1 + e^(ky)).</summary>
    Softplus,

    /// <summary>log(1 − e^(ky)), on ky &lt; 0.</summary>
    LogOneMinus,

    /// <summary>cos(ky).</summary>
    Cosine,

    /// <summary>sin(ky).</summary>
    Sine,
}

/// <summary>The exponent as a sum of shapes in y, each with its row, Jacobian included.</summary>
internal sealed class Shapes(int parameters)
{
    private readonly List<(ShapeKind Kind, Polynomial Rate, AffineRow Row)> _shapes = new();

    /// <summary>What is free of y.</summary>
    public AffineRow Constant { get; private set; } = AffineRow.Zero(parameters);

    public AffineRow Linear => Single(ShapeKind.Linear);

    public AffineRow Square => Single(ShapeKind.Square);

    /// <summary>The shapes of a kind with their rates, without those that vanish.</summary>
    public List<(Polynomial Rate, AffineRow Row)> Of(ShapeKind kind) =>
        _shapes.Where(s => s.Kind == kind && !s.Row.IsZero).Select(s => (s.Rate, s.Row)).ToList();

    /// <summary>Whether only these kinds occur.</summary>
    public bool Only(params ShapeKind[] kinds) => _shapes.All(s => s.Row.IsZero || kinds.Contains(s.Kind));

    public void Add(AffineRow constant) => Constant += constant;

    public void Add(ShapeKind kind, Polynomial rate, AffineRow row)
    {
        var at = _shapes.FindIndex(s => s.Kind == kind && Polynomial.Same(s.Rate, rate));
        if (at < 0)
            _shapes.Add((kind, rate, row));
        else
            _shapes[at] = (kind, rate, _shapes[at].Row + row);
    }

    private AffineRow Single(ShapeKind kind) => _shapes.Where(s => s.Kind == kind).Aggregate(AffineRow.Zero(parameters), (sum, s) => sum + s.Row);
}
