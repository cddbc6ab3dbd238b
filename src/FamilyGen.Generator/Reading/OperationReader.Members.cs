using System;
using System.Collections.Immutable;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;
using SymbolKind = FamilyGen.Generator.Algebra.SymbolKind;

namespace FamilyGen.Generator.Reading;

/// <content>Fields, properties and methods: the user's own are followed, known functions become formulas, and what else
/// is pure is opaque.</content>
internal sealed partial class OperationReader
{
    /// <summary>Reads a declared member, with what its arguments stand for.</summary>
    public Value ReadMember(ISymbol member, Scope scope)
    {
        if (MemberBody.Statements(member, session) is { } body)
            return RunBody(body, scope);
        if (member is IFieldSymbol { IsReadOnly: false, IsConst: false } or IPropertySymbol { SetMethod.IsInitOnly: false })
        {
            session.Depend(DependencyKind.Changing, member.Name, CanBeAssigned(member), session.Mark(member));
            return new NumberValue(Placeholder(-1));
        }

        if (MemberBody.Initializer(member, session) is { } initializer)
            return ReadValue(initializer, scope);
        session.Refuse(session.Mark(member), ShapeFault.NoBody(member.Name));
        return new NumberValue(Placeholder(-1));
    }

    private static string CanBeAssigned(ISymbol member) =>
        member is IFieldSymbol ? "a field that can be assigned" : "a property that can be assigned";

    private Value ReadField(IFieldReferenceOperation reference)
    {
        var field = reference.Field;
        if (ChangingSources.Reason(field) is not null)
            return new NumberValue(Refuse(reference));
        if (field.HasConstantValue)
            return ReadConstant(reference, field);
        if (!field.IsStatic && reference.Instance is not IInstanceReferenceOperation)
            return new NumberValue(Refuse(reference));
        if (!field.IsReadOnly || !field.IsStatic)
            return Changing(reference, field, field.IsReadOnly ? "the state of one instance" : CanBeAssigned(field));
        if (MemberBody.Initializer(field, session) is { } initializer)
            return Inside(field, reference, () => ReadValue(initializer, Scope.Empty));
        return Outside(field, reference);
    }

    private Value ReadConstant(IFieldReferenceOperation reference, IFieldSymbol field)
    {
        if (field.ConstantValue is bool known)
            return new TruthValue(FormulaAt(reference).Always(known));

        // The initializer says more than the value: 1.0/3 is a third.
        if (field.ConstantValue is double value && !double.IsNaN(value) && !double.IsInfinity(value)
            && MemberBody.Initializer(field, session) is { } initializer)
        {
            return Inside(field, reference, () => ReadValue(initializer, Scope.Empty));
        }

        return ConstantNumber.Of(field.ConstantValue, session.Mark(reference.Syntax)) is { } number
            ? new NumberValue(number)
            : new NumberValue(Refuse(reference));
    }

    private Value ReadProperty(IPropertyReferenceOperation reference)
    {
        var property = reference.Property;
        if (ChangingSources.Reason(property) is not null)
            return new NumberValue(Refuse(reference));
        if (IsOwn(property) && GeneratedFace.IsGenerated(property))
            return Generated(reference, property);
        if ((!property.IsStatic && reference.Instance is not IInstanceReferenceOperation) || reference.Arguments.Length > 0)
            return new NumberValue(Refuse(reference));
        if (MemberBody.Statements(property, session) is { } body)
            return Inside(property, reference, () => RunBody(body, Scope.Empty));
        if (property.SetMethod is { IsInitOnly: false })
            return Changing(reference, property, CanBeAssigned(property));
        if (!property.IsStatic)
            return Changing(reference, property, "the state of one instance");
        if (MemberBody.Initializer(property, session) is { } initializer)
            return Inside(property, reference, () => ReadValue(initializer, Scope.Empty));
        return Outside(property, reference);
    }

    private Value ReadCall(IInvocationOperation call, Scope scope)
    {
        var method = call.TargetMethod;
        if (ChangingSources.Reason(method) is not null)
            return new NumberValue(Refuse(call));
        if (IsOwn(method) && GeneratedFace.IsGenerated(method))
            return Generated(call, method);
        if ((!method.IsStatic && call.Instance is not IInstanceReferenceOperation && method.MethodKind != MethodKind.LocalFunction)
            || method.Parameters.Any(p => p.RefKind is RefKind.Ref or RefKind.Out))
        {
            return new NumberValue(Refuse(call));
        }

        if (NumberTests.TryRead(method, call.Arguments.Length) is { } test)
            return new TruthValue(test(FormulaAt(call), ReadNumber(call.Arguments[0].Value, scope)));
        if (IsRange(method.ContainingType))
            return new NumberValue(Refuse(call));
        return MemberBody.IsInSource(method, session) ? ReadOwnCall(call, method, scope) : ReadForeignCall(call, method, scope);
    }

    private Value ReadOwnCall(IInvocationOperation call, IMethodSymbol method, Scope scope)
    {
        if (MemberBody.Statements(method, session) is not { } body)
            return method.IsExtern ? Outside(method, call) : new NumberValue(Refuse(call, ShapeFault.NoBody(method.Name)));
        if (method.TypeParameters.Length > 0 || method.ContainingType.TypeParameters.Length > 0)
            return new NumberValue(Refuse(call, ShapeFault.GenericMember(method.Name)));

        // A local function sees the locals around it.
        var inner = method.MethodKind == MethodKind.LocalFunction ? scope : Scope.Empty;
        foreach (var argument in call.Arguments)
        {
            if (argument.Parameter is { } parameter)
                inner = inner.With(parameter, Bounded(ReadValue(argument.Value, scope), argument));
        }

        return Inside(method, call, () => RunBody(body, inner));
    }

    private Value ReadForeignCall(IInvocationOperation call, IMethodSymbol method, Scope scope)
    {
        if (!(IsNumeric(method.ReturnType) || IsBoolean(method.ReturnType))
            || call.Arguments.Any(a => a.ArgumentKind is not (ArgumentKind.Explicit or ArgumentKind.DefaultValue)
                || !(IsNumeric(a.Parameter?.Type) || IsBoolean(a.Parameter?.Type))))
        {
            return new NumberValue(Refuse(call));
        }

        var arguments = new Expression[method.Parameters.Length];
        foreach (var argument in call.Arguments)
        {
            arguments[argument.Parameter!.Ordinal] = ReadValue(argument.Value, scope) switch
            {
                NumberValue number => number.Expression,
                TruthValue truth => FormulaAt(argument).Conditional(truth.Condition, FormulaAt(argument).Number(1), FormulaAt(argument).Number(0)),
                _ => Refuse(argument.Value),
            };
        }

        var origin = session.Mark(call.Syntax);
        if (SupportedFunctions.TryApply(FullName(method.ContainingType), method.Name, arguments, origin) is { } known)
            return new NumberValue(known);
        return OpaqueValue(method, arguments, call, method.ReturnType);
    }

    /// <summary>Reads what a member of the user's own stands for.</summary>
    private Value Inside(ISymbol member, IOperation use, Func<Value> read)
    {
        if (!session.Follow(member))
            return new NumberValue(Refuse(use, ShapeFault.Recursion(member.Name)));
        var value = read();
        session.Return();
        return value;
    }

    private Value RunBody(ImmutableArray<IOperation> body, Scope scope) =>
        Run(body, 0, scope, new Flow(_ => null, _ => null)) ?? Broken();

    private NumberValue Changing(IOperation use, ISymbol symbol, string reason)
    {
        var origin = session.Mark(use.Syntax);
        session.Depend(DependencyKind.Changing, symbol.Name, reason, origin);
        return new NumberValue(Placeholder(origin));
    }

    // System.Double, not double.
    private static string FullName(INamedTypeSymbol type) => type.ContainingNamespace.ToDisplayString() + "." + type.Name;

    private bool IsOwn(ISymbol member) => SymbolEqualityComparer.Default.Equals(member.ContainingType, session.Family);

    /// <summary>A member that is generated for this family: one that gives a parameter, or follows from them all, is
    /// read as a parameter.</summary>
    private NumberValue Generated(IOperation use, ISymbol member)
    {
        var origin = session.Mark(use.Syntax);
        if (GeneratedNames.IsReserved(member.Name) && !GeneratedNames.DependsOnParameters(member.Name))
        {
            session.Refuse(origin, ShapeFault.GeneratedMember(member.Name));
            return new NumberValue(Placeholder(origin));
        }

        session.Depend(DependencyKind.Parameter, member.Name, "", origin);
        return new NumberValue(new Symbol(member.Name, SymbolKind.Parameter, false) { Origin = origin });
    }

    /// <summary>A member without a body that could be read.</summary>
    private Value Outside(ISymbol member, IOperation use)
    {
        var type = (member as IFieldSymbol)?.Type ?? (member as IPropertySymbol)?.Type ?? ((IMethodSymbol)member).ReturnType;
        if (!member.IsStatic || member is IMethodSymbol { Parameters.Length: > 0 } || !(IsNumeric(type) || IsBoolean(type)))
            return new NumberValue(Refuse(use));
        return OpaqueValue(member, [], use, type);
    }

    private Value OpaqueValue(ISymbol member, Expression[] arguments, IOperation use, ITypeSymbol type)
    {
        var origin = session.Mark(use.Syntax);
        if (!session.Compilation.IsSymbolAccessibleWithin(member, session.Family))
        {
            session.Refuse(origin, ShapeFault.Inaccessible(member.Name));
            return new NumberValue(Placeholder(origin));
        }

        var value = new Opaque(OpaqueText.Of(member), arguments.ToEquatableArray()) { Origin = origin };
        return IsBoolean(type)
            ? new TruthValue(new PlacedFormula(origin).Equal(value, new PlacedFormula(origin).Number(1)))
            : new NumberValue(value);
    }
}
