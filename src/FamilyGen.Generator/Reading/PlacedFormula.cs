using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Reading;

/// <summary>Builds formulas all of whose nodes lead back to one place of the source.</summary>
internal readonly struct PlacedFormula(int origin)
{
    public Expression Number(Rational value) => new Number(value) { Origin = origin };

    public Expression Constant(double value, string text) => new Constant(value, text) { Origin = origin };

    public Expression Add(params Expression[] terms) => new Sum(EquatableArray.Of(terms)) { Origin = origin };

    public Expression Negate(Expression a) => Multiply(Number(-1), a);

    public Expression Subtract(Expression a, Expression b) => Add(a, Negate(b));

    public Expression Multiply(params Expression[] factors) => new Product(EquatableArray.Of(factors)) { Origin = origin };

    public Expression Divide(Expression a, Expression b) => Multiply(a, Power(b, Number(-1)));

    public Expression Power(Expression a, Expression b) => new Power(a, b) { Origin = origin };

    public Expression Call(Function function, params Expression[] arguments) =>
        new Call(function, EquatableArray.Of(arguments)) { Origin = origin };

    public Expression Exp(Expression a) => Call(Function.Exp, a);

    public Expression Log(Expression a) => Call(Function.Log, a);

    public Expression LogGamma(Expression a) => Call(Function.LogGamma, a);

    /// <summary>log Γ(a + 1).</summary>
    public Expression LogFactorial(Expression a) => LogGamma(Add(a, Number(1)));

    public Expression Root(Expression a) => Power(a, Number(new Rational(1, 2)));

    public Expression Conditional(Condition condition, Expression whenTrue, Expression whenFalse) =>
        new Conditional(condition, whenTrue, whenFalse) { Origin = origin };

    /// <summary>The integer next to a on the way to zero.</summary>
    public Expression Truncate(Expression a) =>
        Conditional(Less(a, Number(0)), Negate(Call(Function.Floor, Negate(a))), Call(Function.Floor, a));

    public Condition Compare(Relation relation, Expression a, Expression b) =>
        new Comparison(relation, a, b) { Origin = origin };

    public Condition Less(Expression a, Expression b) => Compare(Relation.Less, a, b);

    public Condition Equal(Expression a, Expression b) => Compare(Relation.Equal, a, b);

    public Condition Not(Condition a) => new Not(a) { Origin = origin };

    public Condition And(Condition a, Condition b) => new And(a, b) { Origin = origin };

    public Condition Or(Condition a, Condition b) => new Or(a, b) { Origin = origin };

    public Condition Always(bool value) => new Always(value) { Origin = origin };

    /// <summary>c ? a : b for conditions.</summary>
    public Condition Choose(Condition c, Condition a, Condition b) => Or(And(c, a), And(Not(c), b));
}
