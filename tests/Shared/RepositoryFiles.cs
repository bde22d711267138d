namespace RebuildPlanner.Tests.Shared;

/// <summary>Finds the checkout's own files (samples, docs, reference data) from a test binary, wherever it was built.</summary>
internal static class RepositoryFiles
{
    public static string Root { get; } = FindRoot();

    public static string At(params string[] parts) => Path.Combine([Root, .. parts]);

    public static string Text(params string[] parts) => File.ReadAllText(At(parts));

    private static string FindRoot()
    {
        for (DirectoryInfo? folder = new(AppContext.BaseDirectory); folder is not null; folder = folder.Parent)
        {
            if (File.Exists(Path.Combine(folder.FullName, "RebuildPlanner.sln")))
            {
                return folder.FullName;
            }
        }

        throw new InvalidOperationException("The tests run inside a checkout of the repository.");
    }
}
