namespace BandSpec.Cli;

/// <summary>What a run of the program ends with; scripts rely on the numbers.</summary>
internal enum ExitCode
{
    /// <summary>Done.</summary>
    Done = 0,

    /// <summary>Done, and the answer is no: no compensation plan fits; or stopped by the user before there was a proof.</summary>
    AnswerIsNo = 1,

    /// <summary>Findings in the input, or a command line that makes no sense.</summary>
    Findings = 2,

    /// <summary>A fault of the program, or of the disk it writes to.</summary>
    Fault = 3,
}
