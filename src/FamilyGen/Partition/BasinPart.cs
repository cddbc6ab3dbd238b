using System;
using FamilyGen.Kernels;
using FamilyGen.Special;

namespace FamilyGen.Partition;

/// <summary>What a sweep found on one basin, relative to the exponent at the basin's own reference point.</summary>
internal sealed class BasinPart<TKernel>
    where TKernel : struct, IKernel
{
    private readonly Basin _basin;

    public BasinPart(Basin basin, Expansion<TKernel> expansion, Sums sums)
    {
        (_basin, Expansion, Sums) = (basin, expansion, sums);
        if (basin.Piece.Step > 0)
        {
            Scale = 1 + sums.Weight;
            LogWeight = Elementary.Log1P(sums.Weight);
        }
        else
        {
            Scale = sums.Weight;
            LogWeight = Math.Log(sums.Weight) + expansion.Frame.LogJacobianAtReference;
        }
    }

    public Basin Basin => _basin;

    /// <summary>The basin, without a copy.</summary>
    public ref readonly Basin BasinReference => ref _basin;

    public Expansion<TKernel> Expansion { get; }

    /// <summary>The sums of the sweep; on a lattice without the reference point's own term, to which every moment about
    /// it is zero.</summary>
    public Sums Sums { get; }

    /// <summary>The weight to which the sums refer, in units of the integrand at the reference point.</summary>
    public double Scale { get; }

    /// <summary>log ∫ exp(f − f(m)) over the basin.</summary>
    public double LogWeight { get; }
}
