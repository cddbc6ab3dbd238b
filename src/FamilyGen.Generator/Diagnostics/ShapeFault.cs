namespace FamilyGen.Generator.Diagnostics;

/// <summary>The sentences of FG0001, one for each way in which a declaration or a formula has the wrong shape.</summary>
internal static class ShapeFault
{
    public static string NotPartial(string name) =>
        $"'{name}' cannot be completed because it is not partial; write 'partial class {name}'";

    public static string OuterNotPartial(string outer, string name) =>
        $"'{outer}' around the family '{name}' is not partial, so nothing can be added inside it; make it partial too";

    public static string Generic(string name) =>
        $"'{name}' has type parameters; a family is one class, so declare one class for each type";

    public static string InGeneric(string outer, string name) =>
        $"'{outer}' around the family '{name}' has type parameters; move the family out of it";

    public static string NotAnOrdinaryClass(string name, string what) =>
        $"'{name}' is {what}; a family is an ordinary partial class, whose instances are the laws for one choice of parameters";

    public static string PrimaryConstructor(string name) =>
        $"'{name}' has a primary constructor; remove it: the constructor from the parameters is generated";

    public static string UnchainedConstructor(string name) =>
        $"This constructor leaves '{name}' without parameters; hand them to the generated constructor with ': this(…)'";

    public static string BaseWithoutConstructor(string name, string baseName) =>
        $"'{name}' derives from '{baseName}', which has no accessible constructor without arguments; derive from nothing, or add one";

    public static string OtherPart(string member, string name) =>
        $"'{member}' stands in another part of '{name}' than [Family]; keep all members of one declaration together";

    public static string NoSupport(string name) =>
        $"'{name}' does not say which values can occur; add a [Support] member such as '[Support] static CountRange Range => CountRange.From(0);'";

    public static string NoStatistic(string name) =>
        $"'{name}' has no statistic; add a [SufficientStatistic] method, or write the whole kernel as a [LogKernel] method";

    public static string BothForms(string member, string kernel) =>
        $"'{member}' belongs to the canonical form and '{kernel}' to the trade form; keep the kernel and move this term into it, or replace the kernel by statistics";

    public static string SecondMember(string member, string first, string role) =>
        $"'{member}' is a second {role} beside '{first}'; keep one of them";

    public static string TwoRoles(string member) =>
        $"'{member}' carries two attributes that say what it is; keep one";

    public static string NotStatic(string member) =>
        $"'{member}' is not static; it must not depend on an instance, so make it static";

    public static string GenericMember(string member) => $"'{member}' has type parameters; write it for the observation's own type";

    public static string NoBody(string member) => $"'{member}' has no body that could be read; write the formula in it";

    public static string PassedByReference(string argument, string member) =>
        $"'{argument}' of '{member}' is passed by reference; pass it by value";

    public static string NoObservation(string member) =>
        $"'{member}' takes no observation; let its first argument be the observed int, long or double";

    public static string ObservationType(string argument, string type, string member) =>
        $"'{argument}' of '{member}' is {type}; an observation is int, long or double";

    public static string OtherObservationType(string argument, string member, string type, string firstMember, string firstType) =>
        $"'{argument}' of '{member}' is {type} but the observation of '{firstMember}' is {firstType}; use one type throughout";

    public static string KnownType(string argument, string type) =>
        $"The known value '{argument}' is {type}; a known value is int, long or double";

    public static string KnownHereOnly(string argument, string member, string knownIn) =>
        $"'{argument}' is a known value in '{knownIn}' but not in '{member}'; mark it [Known] in both";

    public static string ParameterType(string argument, string type) =>
        $"The parameter '{argument}' is {type}; a parameter is double";

    public static string NoParameters(string member) =>
        $"'{member}' has no parameter to estimate; add one as a further double argument";

    public static string ReturnType(string member, string type, string expected) =>
        $"'{member}' returns {type}; it must return {expected}";

    public static string SupportTakesObservation(string argument, string member) =>
        $"'{member}' takes the observation '{argument}'; the range of values does not depend on which value occurs, so take known values only";

    public static string SupportType(string member, string type) =>
        $"'{member}' is {type}; a support is a CountRange, an Interval, or a bool method that narrows a CountRange";

    public static string SupportForOtherObservation(string member, string support, string type) =>
        $"'{member}' is {support} but the observations are {type}; counts (int, long) go with a CountRange and double with an Interval";

    public static string PredicateOnInterval(string member, string range) =>
        $"'{member}' narrows '{range}', which is an Interval; state the ends of the interval instead";

    public static string PredicateNotMethod(string member) =>
        $"'{member}' is a bool that takes no observation; write a bool method of the observation";

    public static string UnreadableRange(string what) =>
        $"{what} is not read as a support; use CountRange.From, Between or AllIntegers, or Interval.RealLine, Above, Below, Between or Circle with IncludingLower, IncludingUpper and WithMassAt";

    public static string ConditionalRange() =>
        "A support is one range; choose between its ends (Between(0, n > 5 ? n : 5)), not between ranges";

    public static string BadParameterName(string text) =>
        $"'{text}' is no name that an argument can have; use letters and digits, starting with a letter";

    public static string Unsupported(string what, string mend) => $"{what} is not read as a formula; {mend}";

    public static string Recursion(string name) =>
        $"'{name}' calls itself; write a closed formula, since a recursion cannot be analysed";

    public static string NotExhaustive() =>
        "This switch leaves some values without a result; add an arm '_ => …'";

    public static string GeneratedMember(string name) =>
        $"'{name}' is generated from this declaration and cannot be used inside it; write the formula itself";

    public static string WrittenByAnotherGenerator(string name) =>
        $"'{name}' uses something that another source generator writes, and generators do not see each other's code; write it into a source file";

    public static string Inaccessible(string name) =>
        $"'{name}' cannot be called from generated code; make it internal, or write the formula itself";

    public static string TooLarge() =>
        "The formula is too large to be analysed; simplify it, or hide a part behind a function of another assembly";
}
