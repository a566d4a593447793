namespace Bandtide.Server.Demo;

/// <summary>Who transmits in a band, which decides when and how strongly.</summary>
internal enum DemoUse
{
    /// <summary>Broadcasting: strong, busiest in the evening of its audience.</summary>
    Broadcasting,

    /// <summary>Amateurs: weaker, awake when people are, busier at the weekend.</summary>
    Amateur,

    /// <summary>Standard frequency and time signals: always on.</summary>
    Standard,

    /// <summary>A mixture of services: a whole slice of the spectrum.</summary>
    Mixture,
}
