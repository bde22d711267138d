namespace RebuildPlanner.Cli;

/// <summary>What a command's exit code says.</summary>
public static class ExitCode
{
    /// <summary>Done.</summary>
    public const int Done = 0;

    /// <summary>Done, and some verdict is outside.</summary>
    public const int Outside = 1;

    /// <summary>The request or the data is wrong; standard error says where and what would be right.</summary>
    public const int Wrong = 2;

    /// <summary>The store failed; standard error says what happened and what to do.</summary>
    public const int StoreFailed = 3;

    /// <summary>Broken off by Ctrl-C: 128 and the number of its signal, as shells have it.</summary>
    public const int BrokenOff = 130;
}
