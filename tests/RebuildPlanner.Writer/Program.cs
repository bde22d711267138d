using System.Globalization;
using RebuildPlanner.Cli;

// One at the bench who never stops: writes readings into a job as the command line does, and says each key once it is acknowledged.
// The tests kill it in the middle, or start eight of it. Arguments: store, job, name of the writer, how many (0 for without end).
(string store, string job, string writer, int count) = (args[0], args[1], args[2], int.Parse(args[3], CultureInfo.InvariantCulture));
const int MostAttempts = 20;
using StringWriter output = new(), error = new();
Terminal terminal = new(output, error, Terminal.UsualWidthColumns, IsScreen: false, () => DateTimeOffset.Now, DataFolder: null);
for (int reading = 0; count == 0 || reading < count; reading++)
{
    string key = $"{writer}-{reading}";
    int code = ExitCode.StoreFailed;

    // Told that another has been writing too long, one tries again: under the same key nothing is added twice.
    for (int attempt = 0; code == ExitCode.StoreFailed && attempt < MostAttempts; attempt++)
    {
        code = Shell.Run(["measure", job, "stroke", $"78.{reading % 1000:D3} mm", "--stage", "as received", "--key", key, "--store", store], terminal);
    }

    if (code != ExitCode.Done)
    {
        Console.Error.WriteLine(error);
        return code;
    }

    Console.WriteLine(key);
    Console.Out.Flush();
}

return ExitCode.Done;
