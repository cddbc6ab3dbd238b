using System;

namespace FamilyGen.Conformance;

/// <summary>The members of one law of any family behind delegates on double observations, for tests that treat all alike.</summary>
internal sealed class Face
{
    private delegate void Filling<T>(Random random, Span<T> draws);

    private readonly object _law;

    public Face(string name, object law)
    {
        (Name, _law) = (name, law);
        IsCount = law.GetType().GetMethod("Cdf")!.GetParameters()[0].ParameterType == typeof(int);
        (Density, Cdf, Survival, Hazard, Quantile) = IsCount
            ? (Counts("Density"), Counts("Cdf"), Counts("Survival"), Counts("Hazard"), Widened(Bind<Func<double, int>>("Quantile", typeof(double))))
            : (Reals("Density"), Reals("Cdf"), Reals("Survival"), Reals("Hazard"), Reals("Quantile"));
    }

    public string Name { get; }

    public bool IsCount { get; }

    public Func<double, double> Density { get; }

    public Func<double, double> Cdf { get; }

    public Func<double, double> Survival { get; }

    public Func<double, double> Hazard { get; }

    public Func<double, double> Quantile { get; }

    public double Mean => Number("Mean");

    public double Variance => Number("Variance");

    public double Entropy => Number("Entropy");

    /// <summary>Draws through the span overload.</summary>
    public double[] Draws(int seed, int count)
    {
        var draws = new double[count];
        if (IsCount)
        {
            var counts = new int[count];
            Bind<Filling<int>>("Sample", typeof(Random), typeof(Span<int>))(new Random(seed), counts);
            Array.Copy(counts, draws, count);
        }
        else
        {
            Bind<Filling<double>>("Sample", typeof(Random), typeof(Span<double>))(new Random(seed), draws);
        }
        return draws;
    }

    /// <summary>One draw after the other.</summary>
    public double[] SingleDraws(int seed, int count)
    {
        var random = new Random(seed);
        var draws = new double[count];
        Func<Random, double> draw = IsCount
            ? Widened(Bind<Func<Random, int>>("Sample", typeof(Random)))
            : Bind<Func<Random, double>>("Sample", typeof(Random));
        for (var i = 0; i < count; i++)
            draws[i] = draw(random);
        return draws;
    }

    public override string ToString() => Name;

    private static Func<T, double> Widened<T>(Func<T, int> function) => x => function(x);

    private Func<double, double> Counts(string name)
    {
        var function = Bind<Func<int, double>>(name, typeof(int));
        return x => function(checked((int)x));
    }

    private Func<double, double> Reals(string name) => Bind<Func<double, double>>(name, typeof(double));

    private TDelegate Bind<TDelegate>(string name, params Type[] arguments)
        where TDelegate : Delegate => _law.GetType().GetMethod(name, arguments)!.CreateDelegate<TDelegate>(_law);

    private double Number(string name) => (double)_law.GetType().GetProperty(name)!.GetValue(_law)!;
}
