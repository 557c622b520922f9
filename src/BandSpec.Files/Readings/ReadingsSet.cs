using BandSpec.Files.Inputs;

namespace BandSpec.Files.Readings;

/// <summary>Readings as they were read from a file, or everything that keeps them from being used.</summary>
/// <typeparam name="T">The kind of reading.</typeparam>
/// <param name="Readings">The readings in the order of the file; empty when there are findings.</param>
/// <param name="Source">The file; <see langword="null"/> when it could not be had.</param>
/// <param name="Findings">What was found, by line and column.</param>
public sealed record ReadingsSet<T>(IReadOnlyList<T> Readings, InputSource? Source, IReadOnlyList<PlacedFinding> Findings);
