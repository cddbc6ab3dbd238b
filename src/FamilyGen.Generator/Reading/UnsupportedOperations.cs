using FamilyGen.Generator.Diagnostics;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;

namespace FamilyGen.Generator.Reading;

/// <summary>Says what an unsupported operation is, in the modeller's words, and what to write instead.</summary>
internal static class UnsupportedOperations
{
    public static string Sentence(IOperation operation) => operation switch
    {
        ILoopOperation => ShapeFault.Unsupported("A loop", "write the sum or product in closed form"),
        IThrowOperation => ShapeFault.Unsupported("'throw'", "give a value instead: the support already decides what can occur"),
        ITryOperation => ShapeFault.Unsupported("'try'", "write the formula alone"),
        IUsingOperation or IUsingDeclarationOperation => ShapeFault.Unsupported("'using'", "write the formula alone"),
        ILockOperation => ShapeFault.Unsupported("'lock'", "write the formula alone"),
        IAwaitOperation => ShapeFault.Unsupported("'await'", "write the formula alone"),
        IBranchOperation => ShapeFault.Unsupported("A jump", "use if, switch and return"),
        IReturnOperation => ShapeFault.Unsupported("'yield'", "return one number"),
        IArrayElementReferenceOperation or IImplicitIndexerReferenceOperation =>
            ShapeFault.Unsupported("An array element", "write the table as a switch expression, since the elements of an array can change"),
        IArrayCreationOperation or ICollectionExpressionOperation =>
            ShapeFault.Unsupported("A list of values", "write a switch expression"),
        ITupleOperation or ITupleBinaryOperation => ShapeFault.Unsupported("A tuple", "use one number at a time"),
        IAnonymousFunctionOperation or IDelegateCreationOperation =>
            ShapeFault.Unsupported("A lambda", "write a static method and call it"),
        IObjectCreationOperation or IWithOperation => ShapeFault.Unsupported("A new object", "use numbers"),
        IAssignmentOperation or IIncrementOrDecrementOperation =>
            ShapeFault.Unsupported("An assignment inside an expression or to something that outlives it", "assign to a local in a statement of its own"),
        IBinaryOperation
        {
            OperatorKind: BinaryOperatorKind.And or BinaryOperatorKind.Or or BinaryOperatorKind.ExclusiveOr
            or BinaryOperatorKind.LeftShift or BinaryOperatorKind.RightShift or BinaryOperatorKind.UnsignedRightShift
        }
            or IUnaryOperation { OperatorKind: UnaryOperatorKind.BitwiseNegation } =>
            ShapeFault.Unsupported("Arithmetic on bits", "use %, / and * (x % 2 for the parity of x)"),
        IBinaryOperation { OperatorMethod: not null } or IUnaryOperation { OperatorMethod: not null }
            or IConversionOperation { OperatorMethod: not null } =>
            ShapeFault.Unsupported("An operator of another type", "use int, long and double"),
        IDynamicInvocationOperation or IDynamicMemberReferenceOperation => ShapeFault.Unsupported("'dynamic'", "use int, long and double"),
        IInvocationOperation { Instance: not null } call =>
            ShapeFault.Unsupported($"A call of '{call.TargetMethod.Name}' on an object", "call a static method with numbers"),
        IInvocationOperation call =>
            ShapeFault.Unsupported($"A call of '{call.TargetMethod.Name}' with anything but numbers", "pass and return numbers"),
        IFieldReferenceOperation { Member: var member } => OfMember(member),
        IPropertyReferenceOperation { Member: var member } => OfMember(member),
        IPatternOperation => ShapeFault.Unsupported("This pattern", "compare a number with constants"),
        _ => ShapeFault.Unsupported("This", "use locals, if, switch, ?:, arithmetic and functions of numbers"),
    };

    private static string OfMember(ISymbol member) =>
        ShapeFault.Unsupported($"'{member.Name}' of an object", "use a constant, a static readonly field or a static member");
}
