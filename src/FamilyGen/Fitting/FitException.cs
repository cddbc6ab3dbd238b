using System;

namespace FamilyGen;

/// <summary>The data do not determine the parameters: the likelihood has no maximum, or none could be established. The
/// message says in which direction the likelihood never stops rising, why, and what can be done.</summary>
public sealed class FitException : Exception
{
    /// <summary>An account of why there is no fit.</summary>
    public FitException(string message)
        : base(message)
    {
    }

    /// <summary>An account of why there is no fit, with what led to it.</summary>
    public FitException(string message, Exception? innerException)
        : base(message, innerException)
    {
    }
}
