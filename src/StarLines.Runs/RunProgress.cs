namespace StarLines.Runs;

/// <summary>An input has ended.</summary>
/// <param name="Ended">How many have ended.</param>
/// <param name="Total">How many there are.</param>
/// <param name="Input">The input.</param>
/// <param name="Error">What went wrong, one sentence; empty where nothing did.</param>
public sealed record RunProgress(int Ended, int Total, string Input, string Error);
