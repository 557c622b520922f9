namespace BandSpec.Documents;

/// <summary>A file of readings that a judgement rests on, as its documents name it.</summary>
/// <param name="Name">Its name.</param>
/// <param name="Lines">How many lines it has.</param>
/// <param name="Layout">How it was read, in words.</param>
public sealed record JudgedFile(string Name, long Lines, string Layout);
