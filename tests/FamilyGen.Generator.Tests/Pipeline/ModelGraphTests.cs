using System;
using System.Collections;
using System.Collections.Generic;
using System.Linq;
using System.Reflection;
using FamilyGen.Generator.Tests.Reading;
using FamilyGen.Generator.Verdicts;

namespace FamilyGen.Generator.Tests.Pipeline;

/// <summary>The model is plain data: whatever can be reached from it holds on to no compilation, and equals what is read of
/// the same source again.</summary>
public class ModelGraphTests
{
    public static TheoryData<string> Declarations => new(
        """
        [Family] public partial class FaultyTwistlocks
        {
            [Support] static CountRange Range([Known] int checkedLocks) => CountRange.Between(0, checkedLocks);
            [Support] static bool Allowed(int x) => x != 3 && !(x > 7) || x is 9;
            [SufficientStatistic] static double Faulty(int x) => x < 4 ? Log(x + 1.5) : Atan(x) + PI * Min(x, 2);
            [LogBaseMeasure] static double Ways(int x, [Known] int checkedLocks) => BinomialLn(checkedLocks, x);
        }
        """,
        """
        namespace Harbour;
        public partial class Crane
        {
            [Family] public partial class RepairHours
            {
                [Support] static Interval Range => Interval.Above(0).WithMassAt(0);
                [LogKernel] static double Kernel(double x, double shape, double rate) => x > 0 ? (shape - 1) * Log(x) - rate * x : 0;
            }
        }
        """,
        """
        [Family] public partial class Moving
        {
            [Support] Interval Range => Interval.Above(Lowest + DateTime.Now.Hour);
            double Lowest => Delay;
            [LogKernel] static double Kernel(double x, double rate, double delay) { while (true) { } }
        }
        """);

    [Theory]
    [MemberData(nameof(Declarations))]
    public void HoldsNothingOfTheCompiler(string declaration)
    {
        var judgement = Judgement.Of(DeclaredSource.Read(declaration).Reading);
        var visited = new HashSet<object>(ReferenceEqualityComparer.Instance);
        Visit(judgement, visited);
        Assert.True(visited.Count > 20);
    }

    [Theory]
    [MemberData(nameof(Declarations))]
    public void IsEqualWhenReadAgain(string declaration)
    {
        var (first, second) = (DeclaredSource.Read(declaration).Reading, DeclaredSource.Read(declaration).Reading);
        Assert.NotSame(first, second);
        Assert.Equal(first, second);
        Assert.Equal(first.GetHashCode(), second.GetHashCode());
        Assert.Equal(Judgement.Of(first), Judgement.Of(second));
    }

    private static void Visit(object? value, HashSet<object> visited)
    {
        if (value is null)
            return;
        var type = value.GetType();
        var home = type.Namespace ?? "";
        Assert.False(home.StartsWith("Microsoft.CodeAnalysis", StringComparison.Ordinal), type.FullName);
        Assert.False(value is Delegate, type.FullName);
        if (type.IsPrimitive || type.IsEnum || value is string || value is System.Numerics.BigInteger || (!type.IsValueType && !visited.Add(value)))
            return;
        if (value is IEnumerable items)
        {
            foreach (var item in items)
                Visit(item, visited);
        }

        if (home.StartsWith("System", StringComparison.Ordinal))
            return;
        for (var part = type; part is not null; part = part.BaseType)
        {
            foreach (var field in part.GetFields(BindingFlags.Instance | BindingFlags.Public | BindingFlags.NonPublic | BindingFlags.DeclaredOnly))
                Visit(field.GetValue(value), visited);
        }
    }
}
