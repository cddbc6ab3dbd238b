using System.Linq;
using System.Runtime.CompilerServices;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;

namespace FamilyGen.Generator.Reading;

/// <summary>Reads C# operations as formulas: the allow-list of what C# may stand in a declaration. What is not on it is a
/// fault at that very node, and reading goes on with a placeholder.</summary>
/// <remarks>
/// <list type="table">
/// <listheader><term>where</term><description>what is read</description></listheader>
/// <item><term>Statements</term><description>blocks, locals, assignments to locals, if, switch, return, local functions</description></item>
/// <item><term>Numbers</term><description>literals, constants, + − * / %, negation, numeric conversions, ?:, switch expressions</description></item>
/// <item><term>Conditions</term><description>comparisons, &amp;&amp; || ! &amp; | ^, is and switch patterns on numbers</description></item>
/// <item><term>Members</term><description>constants, readonly fields, properties and methods of the same assembly, known functions</description></item>
/// <item><term>Ranges</term><description>CountRange and Interval with what is chained to them</description></item>
/// </list>
/// </remarks>
internal sealed partial class OperationReader(ReadingSession session)
{
    private Value ReadValue(IOperation operation, Scope scope)
    {
        if (IsBroken(operation))
            return Broken();
        if (IsBoolean(operation.Type))
            return new TruthValue(ReadCondition(operation, scope));
        if (IsNumeric(operation.Type))
            return new NumberValue(ReadNumber(operation, scope));
        return IsRange(operation.Type) ? ReadRange(operation, scope) : new NumberValue(Refuse(operation));
    }

    private static bool IsBoolean(ITypeSymbol? type) => type?.SpecialType == SpecialType.System_Boolean;

    private static bool IsIntegral(ITypeSymbol? type) =>
        type?.SpecialType is >= SpecialType.System_Char and <= SpecialType.System_UInt64 || type?.TypeKind == TypeKind.Enum;

    private static bool IsNumeric(ITypeSymbol? type) =>
        IsIntegral(type) || type?.SpecialType is SpecialType.System_Decimal or SpecialType.System_Single or SpecialType.System_Double;

    private static bool IsRange(ITypeSymbol? type) => type?.ToDisplayString() is "FamilyGen.CountRange" or "FamilyGen.Interval";

    private static bool IsBroken(IOperation operation) =>
        operation.Kind is OperationKind.Invalid or OperationKind.None || operation.Type?.TypeKind == TypeKind.Error;

    private NumberValue Broken()
    {
        session.LeaveToCompiler();
        return new NumberValue(Placeholder(-1));
    }

    /// <summary>What stands for a formula that could not be read.</summary>
    public static Expression Placeholder(int origin) =>
        new Opaque("double.NaN", EquatableArray<Expression>.Empty) { Origin = origin };

    /// <summary>An operation that is on no list: either it asks something that changes, or it is unsupported.</summary>
    private Expression Refuse(IOperation operation, string? sentence = null)
    {
        if (operation.DescendantsAndSelf().Any(IsBroken))
            return Broken().Expression;
        if (ChangingSources.FindIn(operation) is { } source)
        {
            var place = session.Mark(source.Operation.Syntax);
            session.Depend(DependencyKind.Changing, Describe(source.Symbol), source.Reason, place);
            return Placeholder(place);
        }

        if (operation.DescendantsAndSelf().OfType<IMemberReferenceOperation>().FirstOrDefault(IsGeneratedParameter) is { } parameter)
            return Generated(parameter, parameter.Member).Expression;
        var origin = session.Mark(operation.Syntax);
        session.Refuse(origin, sentence ?? UnsupportedOperations.Sentence(operation));
        return Placeholder(origin);
    }

    // Natural[0] is no number on the list, but it tells what the member depends on.
    private bool IsGeneratedParameter(IMemberReferenceOperation reference) =>
        IsOwn(reference.Member) && GeneratedFace.IsGenerated(reference.Member);

    private Value Bounded(Value value, IOperation place) => Bounded(value, place.Syntax);

    /// <summary>What a name is bound to, as long as its formula is of a size that can be analysed.</summary>
    private Value Bounded(Value value, SyntaxNode place)
    {
        if (FormulaSize.IsManageable(value))
            return value;
        session.Refuse(session.Mark(place), ShapeFault.TooLarge());
        return new NumberValue(Placeholder(-1));
    }

    private static string Describe(ISymbol symbol) => symbol switch
    {
        IMethodSymbol { MethodKind: MethodKind.Constructor } constructor => "new " + constructor.ContainingType.Name,
        { ContainingType: { } type } => type.Name + "." + symbol.Name,
        _ => symbol.Name,
    };

    /// <summary>Whether reading may go one level deeper; a formula nested so deeply that the stack would not hold it is
    /// refused.</summary>
    private bool MayDescend(IOperation operation)
    {
        session.Cancellation.ThrowIfCancellationRequested();
        if (session.IsExhausted)
            return false;
        try
        {
            RuntimeHelpers.EnsureSufficientExecutionStack();
            return true;
        }
        catch (System.InsufficientExecutionStackException)
        {
            session.Refuse(session.Mark(operation.Syntax), ShapeFault.TooLarge());
            return false;
        }
    }
}
