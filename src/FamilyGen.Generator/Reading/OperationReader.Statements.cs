using System;
using System.Collections.Immutable;
using System.Linq;
using FamilyGen.Generator.Algebra;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;

namespace FamilyGen.Generator.Reading;

/// <content>Bodies: statements run in order, each handing the scope on to what comes next.</content>
internal sealed partial class OperationReader
{
    /// <summary>What happens after a statement: the next one, or (in a switch) the one behind the break.</summary>
    private sealed record Flow(Func<Scope, Value?> Next, Func<Scope, Value?> Break);

    private Value? Run(ImmutableArray<IOperation> statements, int index, Scope scope, Flow flow)
    {
        if (index >= statements.Length)
            return flow.Next(scope);
        var rest = flow with { Next = after => Run(statements, index + 1, after, flow) };
        return RunStatement(statements[index], scope, rest);
    }

    private Value? RunStatement(IOperation statement, Scope scope, Flow flow)
    {
        if (!MayDescend(statement))
            return new NumberValue(Placeholder(-1));
        switch (statement)
        {
            case IBlockOperation block:
                return Run(block.Operations, 0, scope, flow);
            case IReturnOperation { Kind: OperationKind.Return, ReturnedValue: { } returned }:
                return ReadValue(returned, scope);
            case IConditionalOperation choice:
                return RunIf(choice, scope, flow);
            case ISwitchOperation choice:
                return RunSwitch(choice, scope, flow);
            case IBranchOperation { BranchKind: BranchKind.Break }:
                return flow.Break(scope);
            case IVariableDeclarationGroupOperation group:
                return flow.Next(Declare(group, scope));
            case IExpressionStatementOperation { Operation: IAssignmentOperation or IIncrementOrDecrementOperation } expression:
                return flow.Next(Assign(expression.Operation, scope));
            case ILocalFunctionOperation or IEmptyOperation:
                return flow.Next(scope);
            case IInvalidOperation or IExpressionStatementOperation { Operation: IInvalidOperation }:
                return Broken();
            case IExpressionStatementOperation expression:
                Refuse(expression.Operation);
                return flow.Next(scope);
            default:
                return new NumberValue(Refuse(statement));
        }
    }

    private Scope Declare(IVariableDeclarationGroupOperation group, Scope scope)
    {
        foreach (var declarator in group.Declarations.SelectMany(d => d.Declarators))
        {
            if (declarator.GetVariableInitializer() is { } initializer)
                scope = scope.With(declarator.Symbol, Bounded(ReadValue(initializer.Value, scope), declarator));
        }

        return scope;
    }

    private Scope Assign(IOperation assignment, Scope scope)
    {
        var target = assignment switch
        {
            ISimpleAssignmentOperation simple => simple.Target,
            ICompoundAssignmentOperation compound => compound.Target,
            IIncrementOrDecrementOperation step => step.Target,
            _ => null,
        };
        ISymbol? variable = target switch
        {
            ILocalReferenceOperation local => local.Local,
            IParameterReferenceOperation { Parameter.RefKind: RefKind.None } parameter => parameter.Parameter,
            _ => null,
        };
        if (target is null || variable is null || IsOutside(variable))
        {
            RefuseAssignment(assignment, target);
            return scope;
        }

        switch (assignment)
        {
            case ISimpleAssignmentOperation simple:
                return scope.With(variable, Bounded(ReadValue(simple.Value, scope), simple));
            case IIncrementOrDecrementOperation step when IsNumeric(step.Type):
                var by = FormulaAt(step).Number(step.Kind == OperationKind.Increment ? 1 : -1);
                return scope.With(variable, Bounded(new NumberValue(FormulaAt(step).Add(ReadNumber(target, scope), by)), step));
            case ICompoundAssignmentOperation { OperatorMethod: null } compound when IsNumeric(compound.Type)
                && compound.OperatorKind is BinaryOperatorKind.Add or BinaryOperatorKind.Subtract or BinaryOperatorKind.Multiply
                    or BinaryOperatorKind.Divide or BinaryOperatorKind.Remainder:
                // The operation is done in the type that both operands are brought to: an int divided by a double is real.
                var isIntegral = IsIntegral(compound.Type) && IsIntegral(compound.Value.Type);
                var (left, right) = (ReadNumber(target, scope), ReadNumber(compound.Value, scope));
                var result = Combine(FormulaAt(compound), compound.OperatorKind, left, right, isIntegral);
                if (isIntegral)
                    NoteIntegers(compound.OperatorKind, compound.Type, left, right, result.Origin);
                if (IsIntegral(compound.Type) && !isIntegral)
                    result = FormulaAt(compound).Truncate(result);
                return scope.With(variable, Bounded(new NumberValue(result), compound));
            default:
                Refuse(assignment);
                return scope;
        }
    }

    // A local function may assign to the locals around it; that effect would be lost when it returns.
    private bool IsOutside(ISymbol variable) =>
        session.Current is IMethodSymbol { MethodKind: MethodKind.LocalFunction } current
        && !SymbolEqualityComparer.Default.Equals(variable.ContainingSymbol.OriginalDefinition, current);

    private void RefuseAssignment(IOperation assignment, IOperation? target)
    {
        if (target is IMemberReferenceOperation member)
        {
            session.Depend(Model.DependencyKind.Changing, member.Member.Name, "something that this formula changes", session.Mark(target.Syntax));
            return;
        }

        Refuse(assignment);
    }

    private Value? RunIf(IConditionalOperation choice, Scope scope, Flow flow) => Branch(
        ReadCondition(choice.Condition, scope),
        inner => RunStatement(choice.WhenTrue, scope, inner),
        inner => choice.WhenFalse is null ? inner.Next(scope) : RunStatement(choice.WhenFalse, scope, inner),
        choice.DescendantsAndSelf().Any(IsExit),
        scope,
        flow,
        choice.Syntax);

    private static bool IsExit(IOperation operation) => operation is IReturnOperation or IBranchOperation;

    /// <summary>Where neither branch leaves the body, what follows is read once, with the locals of both branches joined;
    /// else it is read behind each branch.</summary>
    private Value? Branch(
        Condition condition, Func<Flow, Value?> whenTrue, Func<Flow, Value?> whenFalse, bool canExit, Scope before, Flow flow, SyntaxNode place)
    {
        if (canExit)
            return JoinResults(condition, whenTrue(flow), whenFalse(flow), place);
        Scope afterTrue = before, afterFalse = before;
        whenTrue(new Flow(s => Keep(s, ref afterTrue), s => Keep(s, ref afterTrue)));
        whenFalse(new Flow(s => Keep(s, ref afterFalse), s => Keep(s, ref afterFalse)));
        return flow.Next(JoinScopes(condition, before, afterTrue, afterFalse, place));

        static Value? Keep(Scope scope, ref Scope kept)
        {
            kept = scope;
            return null;
        }
    }

    private Value? JoinResults(Condition condition, Value? a, Value? b, SyntaxNode place) =>
        a is null ? b : b is null ? a : Join(condition, a, b, place);

    private Scope JoinScopes(Condition condition, Scope before, Scope a, Scope b, SyntaxNode place)
    {
        var joined = before;
        foreach (var name in a.Values.Keys.Union(b.Values.Keys, SymbolEqualityComparer.Default).OfType<ISymbol>())
        {
            if ((a.Find(name), b.Find(name)) is not ({ } left, { } right))
                continue;
            joined = joined.With(name, ReferenceEquals(left, right) ? left : Bounded(Join(condition, left, right, place), place));
        }

        return joined;
    }

    private Value? RunSwitch(ISwitchOperation choice, Scope scope, Flow flow)
    {
        var subject = ReadValue(choice.Value, scope);
        var canExit = choice.Cases.SelectMany(c => c.Body).Where(s => !IsBreak(s)).SelectMany(s => s.DescendantsAndSelf()).Any(IsExit);
        var otherwise = choice.Cases.FirstOrDefault(c => c.Clauses.Any(k => k is IDefaultCaseClauseOperation));
        var sections = choice.Cases.Where(c => c != otherwise).ToImmutableArray();
        return RunSections(0, flow with { Break = flow.Next });

        Value? RunSections(int index, Flow inner)
        {
            if (index == sections.Length)
                return otherwise is null ? inner.Next(scope) : Run(otherwise.Body, 0, scope, inner);
            var (condition, names) = ReadClauses(sections[index], subject, scope);
            return Branch(
                condition,
                body => Run(sections[index].Body, 0, names, body with { Break = body.Next }),
                body => RunSections(index + 1, body with { Break = body.Next }),
                canExit,
                scope,
                inner,
                choice.Syntax);
        }
    }

    private static bool IsBreak(IOperation statement) => statement is IBranchOperation { BranchKind: BranchKind.Break };

    private (Condition Condition, Scope Scope) ReadClauses(ISwitchCaseOperation section, Value subject, Scope scope)
    {
        Condition? any = null;
        foreach (var clause in section.Clauses)
        {
            Condition condition;
            switch (clause)
            {
                case ISingleValueCaseClauseOperation single when subject is NumberValue number:
                    condition = FormulaAt(clause).Equal(number.Expression, ReadNumber(single.Value, scope));
                    break;
                case IPatternCaseClauseOperation pattern:
                    (condition, scope) = ReadPattern(pattern.Pattern, subject, scope);
                    if (pattern.Guard is not null)
                        condition = FormulaAt(clause).And(condition, ReadCondition(pattern.Guard, scope));
                    break;
                default:
                    Refuse(clause);
                    condition = new Always(false);
                    break;
            }

            any = any is null ? condition : FormulaAt(section).Or(any, condition);
        }

        return (any ?? new Always(false), scope);
    }
}
