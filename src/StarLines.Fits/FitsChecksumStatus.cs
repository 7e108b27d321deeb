namespace StarLines.Fits;

/// <summary>What a checksum keyword says of the content.</summary>
public enum FitsChecksumStatus
{
    /// <summary>The keyword is absent, blank or unreadable.</summary>
    Absent,

    /// <summary>The content is as it was written.</summary>
    Correct,

    /// <summary>The content has changed since it was written.</summary>
    Wrong,
}
