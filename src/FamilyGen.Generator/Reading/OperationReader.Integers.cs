using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;

namespace FamilyGen.Generator.Reading;

/// <content>Arithmetic in integers, which may drop a fraction or overflow. What is compared in a condition is left alone: to
/// sort counts into classes by whole division is what it is for.</content>
internal sealed partial class OperationReader
{
    private void NoteIntegers(BinaryOperatorKind kind, ITypeSymbol? type, Expression left, Expression right, int origin)
    {
        if (!IsIntegral(type))
            return;
        if (kind == BinaryOperatorKind.Divide)
            NoteStep(IntegerStepKind.Quotient, type!, left, right, origin);
        else if (kind == BinaryOperatorKind.Multiply)
            NoteStep(IntegerStepKind.Product, type!, left, right, origin);
    }

    private void NoteStep(IntegerStepKind kind, ITypeSymbol type, Expression left, Expression right, int origin)
    {
        if (_conditions == 0)
            session.Note(new IntegerStep(kind, type.ToDisplayString(), left, right, origin));
    }

    // 1 / 2 is 0 before anything is read of it.
    private void NoteConstantQuotients(IOperation operation)
    {
        if (operation is not (IBinaryOperation or IConversionOperation or IParenthesizedOperation))
            return;
        foreach (var quotient in operation.DescendantsAndSelf().OfType<IBinaryOperation>())
        {
            if (quotient.OperatorKind == BinaryOperatorKind.Divide && IsIntegral(quotient.Type)
                && ConstantNumber.Of(quotient.LeftOperand.ConstantValue.Value, -1) is { } left
                && ConstantNumber.Of(quotient.RightOperand.ConstantValue.Value, -1) is { } right)
            {
                NoteStep(IntegerStepKind.Quotient, quotient.Type!, left, right, session.Mark(quotient.Syntax));
            }
        }
    }
}
