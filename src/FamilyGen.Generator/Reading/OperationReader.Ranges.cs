using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;

namespace FamilyGen.Generator.Reading;

/// <content>Supports: CountRange and Interval.</content>
internal sealed partial class OperationReader
{
    private static readonly RangeValue s_line =
        new(false, null, null, false, false, false, EquatableArray<Expression>.Empty);

    private static readonly RangeValue s_integers =
        new(true, null, null, true, true, false, EquatableArray<Expression>.Empty);

    private Value ReadRange(IOperation operation, Scope scope)
    {
        if (!MayDescend(operation))
            return s_line;
        switch (operation)
        {
            case IParenthesizedOperation parenthesized:
                return ReadRange(parenthesized.Operand, scope);
            case IConversionOperation { OperatorMethod: null, Operand: var operand } when IsRange(operand.Type):
                return ReadRange(operand, scope);
            case IDefaultValueOperation when operation.Type?.Name == "CountRange":
                return s_integers;
            case IPropertyReferenceOperation { Property: { IsStatic: true, Name: "AllIntegers" } property } when IsRange(property.ContainingType):
                return s_integers;
            case IPropertyReferenceOperation { Property: { IsStatic: true, Name: "RealLine" } property } when IsRange(property.ContainingType):
                return s_line;
            case IInvocationOperation { TargetMethod: var method } call when IsRange(method.ContainingType):
                return method.IsStatic ? ReadRangeFactory(call, scope) : ReadRangeRefinement(call, scope);
            case IInvocationOperation call:
                return AsRange(ReadCall(call, scope));
            case IPropertyReferenceOperation property:
                return AsRange(ReadProperty(property));
            case IFieldReferenceOperation field:
                return AsRange(ReadField(field));
            case ILocalReferenceOperation local:
                return AsRange(ReadVariable(local, local.Local, scope));
            case IParameterReferenceOperation parameter:
                return AsRange(ReadVariable(parameter, parameter.Parameter, scope));
            case IConditionalOperation or ISwitchExpressionOperation:
                Refuse(operation, ShapeFault.ConditionalRange());
                return s_line;
            default:
                RefuseRange(operation);
                return s_line;
        }
    }

    private static RangeValue AsRange(Value value) => value as RangeValue ?? s_line;

    private void RefuseRange(IOperation operation) => Refuse(operation, ShapeFault.UnreadableRange("This"));

    private RangeValue ReadRangeFactory(IInvocationOperation call, Scope scope)
    {
        var ends = new Expression[call.Arguments.Length];
        foreach (var argument in call.Arguments)
            ends[argument.Parameter!.Ordinal] = ReadNumber(argument.Value, scope);
        var isLattice = call.TargetMethod.ContainingType.Name == "CountRange";
        switch (call.TargetMethod.Name, ends.Length)
        {
            case ("From", 1):
                return s_integers with { Lower = ends[0] };
            case ("Between", 2):
                return isLattice
                    ? s_integers with { Lower = ends[0], Upper = ends[1] }
                    : s_line with { Lower = FiniteEnd(ends[0], double.NegativeInfinity), Upper = FiniteEnd(ends[1], double.PositiveInfinity) };
            case ("Above", 1):
                return s_line with { Lower = FiniteEnd(ends[0], double.NegativeInfinity) };
            case ("Below", 1):
                return s_line with { Upper = FiniteEnd(ends[0], double.PositiveInfinity) };
            case ("Circle", 1):
                return s_line with { Lower = FormulaAt(call).Number(0), Upper = ends[0], LowerIncluded = true, IsCircle = true };
            default:
                RefuseRange(call);
                return s_line;
        }
    }

    /// <summary>An end that is written as infinity is no end.</summary>
    private static Expression? FiniteEnd(Expression end, double infinity) =>
        end is Constant { Value: var value } && value.Equals(infinity) ? null : end;

    private RangeValue ReadRangeRefinement(IInvocationOperation call, Scope scope)
    {
        if (call.Instance is null || AsRange(ReadValue(call.Instance, scope)) is not { IsLattice: false } range)
        {
            RefuseRange(call);
            return s_line;
        }

        switch (call.TargetMethod.Name)
        {
            case "IncludingLower":
                return range with { LowerIncluded = range.Lower is not null };
            case "IncludingUpper":
                return range with { UpperIncluded = range.Upper is not null && !range.IsCircle };
            case "WithMassAt":
                var point = ReadNumber(call.Arguments[0].Value, scope);
                return range with { Masses = EquatableArray.Of([.. range.Masses, point]) };
            default:
                RefuseRange(call);
                return s_line;
        }
    }
}
