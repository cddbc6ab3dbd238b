namespace FamilyGen;

/// <summary>What kind of maximum a fit ended at.</summary>
public enum FitStatus
{
    /// <summary>The only maximum of the likelihood, inside the parameter set.</summary>
    InteriorMaximum,

    /// <summary>The only maximum of the likelihood, on the boundary of the parameter set: the likelihood would rise further
    /// beyond it, where the normalizer is infinite. The parameters held there have no standard errors.</summary>
    OnBoundary,

    /// <summary>The highest maximum that several starts found of a likelihood that may have others.</summary>
    LocalMaximum,
}
