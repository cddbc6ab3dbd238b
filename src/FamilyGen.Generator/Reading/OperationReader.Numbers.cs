using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;

namespace FamilyGen.Generator.Reading;

/// <content>Numbers: literals, arithmetic, conversions and choices.</content>
internal sealed partial class OperationReader
{
    private Expression ReadNumber(IOperation operation, Scope scope)
    {
        if (IsBroken(operation))
            return Broken().Expression;
        if (!MayDescend(operation))
            return Placeholder(-1);
        if (ConstantNumber.TryRead(operation, session.Mark(operation.Syntax)) is { } constant)
        {
            NoteConstantQuotients(operation);
            return constant;
        }

        return operation switch
        {
            IParenthesizedOperation parenthesized => ReadNumber(parenthesized.Operand, scope),
            IConversionOperation conversion => ReadConversion(conversion, scope),
            IUnaryOperation { OperatorMethod: null } unary => ReadUnary(unary, scope),
            IBinaryOperation binary when binary.OperatorMethod is null || binary.Type?.SpecialType == SpecialType.System_Decimal
                => ReadBinary(binary, scope),
            IConditionalOperation { WhenFalse: not null } choice => FormulaAt(choice).Conditional(
                ReadCondition(choice.Condition, scope), ReadNumber(choice.WhenTrue, scope), ReadNumber(choice.WhenFalse, scope)),
            ISwitchExpressionOperation choice => AsNumber(ReadSwitchExpression(choice, scope)),
            ILocalReferenceOperation local => AsNumber(ReadVariable(local, local.Local, scope)),
            IParameterReferenceOperation parameter => AsNumber(ReadVariable(parameter, parameter.Parameter, scope)),
            IFieldReferenceOperation field => AsNumber(ReadField(field)),
            IPropertyReferenceOperation property => AsNumber(ReadProperty(property)),
            IInvocationOperation call => AsNumber(ReadCall(call, scope)),
            _ => Refuse(operation),
        };
    }

    private PlacedFormula FormulaAt(IOperation operation) => new(session.Mark(operation.Syntax));

    private static Expression AsNumber(Value value) => value is NumberValue number ? number.Expression : Placeholder(-1);

    private Expression ReadUnary(IUnaryOperation unary, Scope scope)
    {
        switch (unary.OperatorKind)
        {
            case UnaryOperatorKind.Plus:
                return ReadNumber(unary.Operand, scope);
            case UnaryOperatorKind.Minus:
                return FormulaAt(unary).Negate(ReadNumber(unary.Operand, scope));
            default:
                return Refuse(unary);
        }
    }

    private Expression ReadBinary(IBinaryOperation binary, Scope scope)
    {
        if (binary.OperatorKind is not (BinaryOperatorKind.Add or BinaryOperatorKind.Subtract or BinaryOperatorKind.Multiply
            or BinaryOperatorKind.Divide or BinaryOperatorKind.Remainder))
        {
            return Refuse(binary);
        }

        var left = ReadNumber(binary.LeftOperand, scope);
        var right = ReadNumber(binary.RightOperand, scope);
        var result = Combine(FormulaAt(binary), binary.OperatorKind, left, right, IsIntegral(binary.Type));
        NoteIntegers(binary.OperatorKind, binary.Type, left, right, result.Origin);
        return result;
    }

    private static Expression Combine(PlacedFormula formula, BinaryOperatorKind kind, Expression a, Expression b, bool isIntegral) => kind switch
    {
        BinaryOperatorKind.Add => formula.Add(a, b),
        BinaryOperatorKind.Subtract => formula.Subtract(a, b),
        BinaryOperatorKind.Multiply => formula.Multiply(a, b),
        BinaryOperatorKind.Remainder => formula.Call(Function.Remainder, a, b),
        _ when isIntegral => formula.Call(Function.IntegerQuotient, a, b),
        _ => formula.Divide(a, b),
    };

    private Expression ReadConversion(IConversionOperation conversion, Scope scope)
    {
        var (from, to) = (conversion.Operand.Type, conversion.Type);
        if (conversion.OperatorMethod is not null && !(IsNumeric(from) && IsNumeric(to)))
            return Refuse(conversion);
        if (IsBroken(conversion.Operand))
            return Broken().Expression;
        if (!IsNumeric(from))
            return Refuse(conversion);
        var operand = ReadNumber(conversion.Operand, scope);

        // Towards integers the fraction is cut off; towards float digits are lost, which no formula says. A conversion
        // between integers is taken to fit.
        if (IsIntegral(to) && !IsIntegral(from))
        {
            if (!conversion.IsImplicit)
                NoteStep(IntegerStepKind.Conversion, to!, operand, operand, session.Mark(conversion.Syntax));
            return FormulaAt(conversion).Truncate(operand);
        }

        return to?.SpecialType == SpecialType.System_Single && from?.SpecialType == SpecialType.System_Double
            ? new Opaque("(double)(float)({0})", EquatableArray.Of(operand)) { Origin = session.Mark(conversion.Syntax) }
            : operand;
    }

    private Value ReadVariable(IOperation operation, ISymbol variable, Scope scope)
    {
        if (scope.Find(variable) is { } value)
            return value;

        // A local const of an enclosing body is no part of a local function's scope.
        if (variable is ILocalSymbol { HasConstantValue: true } constant && ConstantNumber.Of(constant.ConstantValue, session.Mark(operation.Syntax)) is { } number)
            return new NumberValue(number);
        return new NumberValue(Refuse(operation));
    }

    private Value ReadSwitchExpression(ISwitchExpressionOperation choice, Scope scope)
    {
        var subject = ReadValue(choice.Value, scope);
        if (!choice.IsExhaustive)
            return new NumberValue(Refuse(choice, ShapeFault.NotExhaustive()));
        var arms = choice.Arms;
        return ReadArms(0);

        Value ReadArms(int index)
        {
            var arm = arms[index];
            var (condition, inner) = ReadPattern(arm.Pattern, subject, scope);
            if (arm.Guard is not null)
                condition = FormulaAt(arm.Guard).And(condition, ReadCondition(arm.Guard, inner));
            var value = ReadValue(arm.Value, inner);

            // The compiler has proved that one of the arms applies, so the last one needs no condition.
            return index == arms.Length - 1 ? value : Join(condition, value, ReadArms(index + 1), choice.Syntax);
        }
    }

    /// <summary>condition ? whenTrue : whenFalse, for whatever the two are.</summary>
    private Value Join(Condition condition, Value whenTrue, Value whenFalse, SyntaxNode place)
    {
        if (condition is Always { Value: var known })
            return known ? whenTrue : whenFalse;
        switch (whenTrue, whenFalse)
        {
            case (NumberValue a, NumberValue b):
                return new NumberValue(new PlacedFormula(session.Mark(place)).Conditional(condition, a.Expression, b.Expression));
            case (TruthValue a, TruthValue b):
                return new TruthValue(new PlacedFormula(session.Mark(place)).Choose(condition, a.Condition, b.Condition));
            default:
                if (whenTrue is RangeValue && whenFalse is RangeValue)
                    session.Refuse(session.Mark(place), ShapeFault.ConditionalRange());
                return whenTrue;
        }
    }
}
