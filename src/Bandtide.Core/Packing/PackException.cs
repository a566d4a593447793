namespace Bandtide.Core.Packing;

/// <summary>Packed bytes that cannot be what was written; the message completes "… is corrupt: ".</summary>
#pragma warning disable CA1032 // One way to make it: it always says what is wrong.
internal sealed class PackException(string message) : Exception(message);
#pragma warning restore CA1032
