namespace Bandtide.Core.Stations;

/// <summary>Unit of a station's decibel values.</summary>
public enum LevelUnit
{
    /// <summary>Decibels relative to full scale: not calibrated.</summary>
    DbFullScale,

    /// <summary>Decibels relative to one milliwatt.</summary>
    DbMilliwatt,

    /// <summary>Decibels relative to one microvolt.</summary>
    DbMicrovolt,

    /// <summary>Decibels relative to one microvolt per metre: field strength.</summary>
    DbMicrovoltPerMetre,
}
