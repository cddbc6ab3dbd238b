using System;

namespace FamilyGen.Partition;

/// <summary>The normalizer of a family, or one of its moments, cannot be evaluated to the stated accuracy: the exponent
/// oscillates too often, a sum needs more terms than the budget allows, or a part of it is not a number. The message says
/// which.</summary>
public sealed class PartitionException : Exception
{
    /// <summary>An exception that says why the evaluation stopped.</summary>
    public PartitionException(string message)
        : base(message)
    {
    }

    /// <summary>An exception that says why the evaluation stopped, with its cause.</summary>
    public PartitionException(string message, Exception inner)
        : base(message, inner)
    {
    }
}
