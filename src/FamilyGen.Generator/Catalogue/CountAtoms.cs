using System.Collections.Generic;
using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Catalogue;

/// <summary>The exponent on a range of counts, sorted by what the entries there are made of: x itself, log Γ(±x + a) and
/// log(x + a).</summary>
internal sealed class CountAtoms
{
    private CountAtoms(int parameters) => (Linear, Constant) = (AffineRow.Zero(parameters), AffineRow.Zero(parameters));

    public AffineRow Linear { get; private set; }

    public AffineRow Constant { get; private set; }

    /// <summary>log Γ(x + shift).</summary>
    public List<(Polynomial Shift, AffineRow Row)> Rising { get; } = new();

    /// <summary>log Γ(shift − x).</summary>
    public List<(Polynomial Shift, AffineRow Row)> Falling { get; } = new();

    /// <summary>log(x + shift).</summary>
    public List<(Polynomial Shift, AffineRow Row)> Logarithms { get; } = new();

    /// <summary>Null where anything else occurs.</summary>
    public static CountAtoms? Of(AtomRows rows, Piece piece)
    {
        var result = new CountAtoms(rows.Parameters) { Constant = rows.Constant };
        foreach (var (atom, row) in rows.Atoms)
        {
            if (!result.Add(atom, row, piece))
                return null;
        }

        return result;
    }

    private bool Add(Expression atom, AffineRow row, Piece piece)
    {
        if (atom is Symbol)
        {
            Linear += row;
            return true;
        }

        if (atom is not Call call || Affine.In(call.Arguments[0], piece.Observation) is not { } affine)
            return false;
        var (slope, shift) = (piece.Value(affine.Slope), piece.Value(affine.Intercept));
        switch (call.Function)
        {
            case Function.LogGamma when slope.AsRational() == 1:
                Rising.Add((shift, row));
                return true;
            case Function.LogGamma when slope.AsRational() == -1:
                Falling.Add((shift, row));
                return true;
            case Function.Log when slope.AsRational() is { Sign: > 0 }:
                Constant += row * piece.Value(Formula.Log(affine.Slope));
                Logarithms.Add((shift * slope.Inverse(), row));
                return true;
            default:
                return false;
        }
    }
}
