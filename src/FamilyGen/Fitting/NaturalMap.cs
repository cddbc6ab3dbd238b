using System;
using FamilyGen.Kernels;

namespace FamilyGen.Fitting;

/// <summary>η(φ) at one point with its first and second derivatives in the trade parameters.</summary>
internal sealed class NaturalMap
{
    private readonly Jet[] _jets;

    private NaturalMap(Jet[] jets, int parameters)
    {
        _jets = jets;
        Parameters = parameters;
        Theta = new double[jets.Length];
        for (var j = 0; j < jets.Length; j++)
            Theta[j] = jets[j].Value;
    }

    /// <summary>The number of trade parameters.</summary>
    public int Parameters { get; }

    /// <summary>The natural parameters η(φ).</summary>
    public double[] Theta { get; }

    public static NaturalMap At<TKernel>(TKernel kernel, ReadOnlySpan<double> parameters)
        where TKernel : struct, ITradeKernel
    {
        var jets = new Jet[TKernel.Count];
        kernel.Natural<Jet>(Jet.Variables(parameters), jets);
        return new(jets, parameters.Length);
    }

    /// <summary>∂ηⱼ/∂φᵢ.</summary>
    public double First(int j, int i) => _jets[j].Gradient(i);

    /// <summary>∂²ηⱼ/∂φₐ∂φ_b.</summary>
    public double Second(int j, int a, int b) => _jets[j].Hessian(a, b);

    /// <summary>The column ∂η/∂φᵢ.</summary>
    public double[] Column(int i)
    {
        var column = new double[_jets.Length];
        for (var j = 0; j < column.Length; j++)
            column[j] = First(j, i);
        return column;
    }

    /// <summary>The column ∂²η/∂φₐ∂φ_b.</summary>
    public double[] Column(int a, int b)
    {
        var column = new double[_jets.Length];
        for (var j = 0; j < column.Length; j++)
            column[j] = Second(j, a, b);
        return column;
    }

    /// <summary>The Jacobian.</summary>
    public double[,] Jacobian()
    {
        var jacobian = new double[_jets.Length, Parameters];
        for (var j = 0; j < _jets.Length; j++)
        {
            for (var i = 0; i < Parameters; i++)
                jacobian[j, i] = First(j, i);
        }

        return jacobian;
    }
}
