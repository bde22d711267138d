using System.Runtime.InteropServices;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Benchmarks;

/// <summary>The program as a shop would install it.</summary>
internal static class Builds
{
    private static string CommandLine => RepositoryFiles.At("src", "RebuildPlanner.Cli", "RebuildPlanner.Cli.csproj");

    /// <summary>One native executable, or null after a word why not.</summary>
    public static string? Native(string to)
    {
        try
        {
            return Path.Combine(Publish(CommandLine, to, "-p:PublishAot=true"), OperatingSystem.IsWindows() ? "rebuild.exe" : "rebuild");
        }
        catch (InvalidOperationException)
        {
            Console.WriteLine("no native build, skipped. It needs clang and the headers of zlib (packages clang, zlib1g-dev).");
            return null;
        }
    }

    /// <summary>Compiled ahead, but leaning on the installed runtime.</summary>
    public static string OnRuntime(string to) => Path.Combine(Publish(CommandLine, to, "--self-contained", "false", "-p:PublishReadyToRun=true"), "rebuild.dll");

    /// <summary>Publishes a project for this machine.</summary>
    public static string Publish(string project, string to, params string[] how)
    {
        Tool.Output("dotnet", ["publish", project, "-c", "Release", "-r", Machine(), .. how, "-o", to, "-v", "quiet", "-nologo"]);
        return to;
    }

    /// <summary>A project of one file, from the resources of this program; its path.</summary>
    /// <param name="folder">Where it is made.</param>
    /// <param name="name">Its name.</param>
    /// <param name="program">The resource of its one file.</param>
    /// <param name="project">The resource of the project file.</param>
    public static string Project(string folder, string name, string program, string project)
    {
        string home = Directory.CreateDirectory(Path.Combine(folder, name)).FullName, path = Path.Combine(home, name + ".csproj");
        File.WriteAllText(Path.Combine(home, "Program.cs"), Resource(program));
        File.WriteAllText(path, Resource(project));
        return path;
    }

    private static string Resource(string name)
    {
        using StreamReader reader = new(typeof(Builds).Assembly.GetManifestResourceStream(name)!);
        return reader.ReadToEnd();
    }

    // Not the SDK's own identifier, which on some distributions names the distribution.
    private static string Machine() =>
        (OperatingSystem.IsWindows() ? "win-" : OperatingSystem.IsMacOS() ? "osx-" : "linux-")
        + RuntimeInformation.OSArchitecture.ToString().ToLowerInvariant();
}
