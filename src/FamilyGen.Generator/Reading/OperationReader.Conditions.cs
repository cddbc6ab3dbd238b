using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;

namespace FamilyGen.Generator.Reading;

/// <content>Yes/no questions and patterns.</content>
internal sealed partial class OperationReader
{
    // How deep in conditions the reader stands.
    private int _conditions;

    private Condition ReadCondition(IOperation operation, Scope scope)
    {
        _conditions++;
        var condition = ReadConditionItself(operation, scope);
        _conditions--;
        return condition;
    }

    private Condition ReadConditionItself(IOperation operation, Scope scope)
    {
        if (IsBroken(operation))
        {
            session.LeaveToCompiler();
            return new Always(false);
        }

        if (!MayDescend(operation))
            return new Always(false);
        if (operation.ConstantValue is { HasValue: true, Value: bool known })
            return FormulaAt(operation).Always(known);
        switch (operation)
        {
            case IParenthesizedOperation parenthesized:
                return ReadCondition(parenthesized.Operand, scope);
            case IConversionOperation { OperatorMethod: null } conversion when IsBoolean(conversion.Operand.Type):
                return ReadCondition(conversion.Operand, scope);
            case IUnaryOperation { OperatorKind: UnaryOperatorKind.Not, OperatorMethod: null } not:
                return FormulaAt(not).Not(ReadCondition(not.Operand, scope));
            case IBinaryOperation binary when IsBoolean(binary.LeftOperand.Type) && binary.OperatorMethod is null:
                return ReadLogic(binary, scope);
            case IBinaryOperation binary when IsNumeric(binary.LeftOperand.Type) && IsNumeric(binary.RightOperand.Type):
                return ReadComparison(binary, scope);
            case IIsPatternOperation question:
                return ReadPattern(question.Pattern, ReadValue(question.Value, scope), scope).Condition;
            case IConditionalOperation { WhenFalse: not null } choice:
                return FormulaAt(choice).Choose(
                    ReadCondition(choice.Condition, scope), ReadCondition(choice.WhenTrue, scope), ReadCondition(choice.WhenFalse, scope));
            case ISwitchExpressionOperation choice:
                return AsCondition(ReadSwitchExpression(choice, scope));
            case ILocalReferenceOperation local:
                return AsCondition(ReadVariable(local, local.Local, scope));
            case IParameterReferenceOperation parameter:
                return AsCondition(ReadVariable(parameter, parameter.Parameter, scope));
            case IFieldReferenceOperation field:
                return AsCondition(ReadField(field));
            case IPropertyReferenceOperation property:
                return AsCondition(ReadProperty(property));
            case IInvocationOperation call:
                return AsCondition(ReadCall(call, scope));
            default:
                Refuse(operation);
                return new Always(false);
        }
    }

    private static Condition AsCondition(Value value) => value is TruthValue truth ? truth.Condition : new Always(false);

    private Condition ReadLogic(IBinaryOperation binary, Scope scope)
    {
        var left = ReadCondition(binary.LeftOperand, scope);
        var right = ReadCondition(binary.RightOperand, scope);
        var formula = FormulaAt(binary);
        switch (binary.OperatorKind)
        {
            case BinaryOperatorKind.And or BinaryOperatorKind.ConditionalAnd:
                return formula.And(left, right);
            case BinaryOperatorKind.Or or BinaryOperatorKind.ConditionalOr:
                return formula.Or(left, right);
            case BinaryOperatorKind.Equals:
                return formula.Choose(left, right, formula.Not(right));
            case BinaryOperatorKind.ExclusiveOr or BinaryOperatorKind.NotEquals:
                return formula.Choose(left, formula.Not(right), right);
            default:
                Refuse(binary);
                return formula.Always(false);
        }
    }

    private Condition ReadComparison(IBinaryOperation binary, Scope scope)
    {
        var left = ReadNumber(binary.LeftOperand, scope);
        var right = ReadNumber(binary.RightOperand, scope);
        if (Compare(FormulaAt(binary), binary.OperatorKind, left, right) is { } condition)
            return condition;
        Refuse(binary);
        return new Always(false);
    }

    private static Condition? Compare(PlacedFormula formula, BinaryOperatorKind kind, Expression a, Expression b) => kind switch
    {
        BinaryOperatorKind.LessThan => formula.Less(a, b),
        BinaryOperatorKind.GreaterThan => formula.Less(b, a),
        BinaryOperatorKind.LessThanOrEqual => formula.Compare(Relation.LessOrEqual, a, b),
        BinaryOperatorKind.GreaterThanOrEqual => formula.Compare(Relation.LessOrEqual, b, a),
        BinaryOperatorKind.Equals => formula.Equal(a, b),
        BinaryOperatorKind.NotEquals => formula.Not(formula.Equal(a, b)),
        _ => null,
    };

    /// <summary>When the pattern applies, and the scope with what it names.</summary>
    private (Condition Condition, Scope Scope) ReadPattern(IPatternOperation pattern, Value subject, Scope scope)
    {
        var formula = FormulaAt(pattern);
        switch (pattern)
        {
            case IDiscardPatternOperation:
                return (formula.Always(true), scope);
            case IDeclarationPatternOperation { DeclaredSymbol: { } name } declaration
                when declaration.MatchesNull || SymbolEqualityComparer.Default.Equals(declaration.MatchedType, declaration.InputType):
                return (formula.Always(true), scope.With(name, subject));
            case INegatedPatternOperation not:
                return (formula.Not(ReadPattern(not.Pattern, subject, scope).Condition), scope);
            case IBinaryPatternOperation both:
                var (left, afterLeft) = ReadPattern(both.LeftPattern, subject, scope);
                var (right, afterRight) = ReadPattern(both.RightPattern, subject, afterLeft);
                return (both.OperatorKind == BinaryOperatorKind.And ? formula.And(left, right) : formula.Or(left, right), afterRight);
            case IConstantPatternOperation { Value.ConstantValue: { HasValue: true, Value: bool expected } } when subject is TruthValue truth:
                return (expected ? truth.Condition : formula.Not(truth.Condition), scope);
            case IConstantPatternOperation constant when subject is NumberValue number:
                return (formula.Equal(number.Expression, ReadNumber(constant.Value, scope)), scope);
            case IRelationalPatternOperation relational when subject is NumberValue number
                && Compare(formula, relational.OperatorKind, number.Expression, ReadNumber(relational.Value, scope)) is { } condition:
                return (condition, scope);
            default:
                Refuse(pattern);
                return (formula.Always(false), scope);
        }
    }
}
