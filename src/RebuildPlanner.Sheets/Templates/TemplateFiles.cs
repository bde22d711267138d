namespace RebuildPlanner.Sheets.Templates;

/// <summary>The files a shop may edit, as they come with the program: blank jobs, the words of the sheets, the shop itself.</summary>
public static class TemplateFiles
{
    /// <summary>The file of the sheets' words.</summary>
    public const string Wording = "sheet-wording.json";

    /// <summary>The file of the shop.</summary>
    public const string Shop = "shop.json";

    private const string Prefix = "templates/";

    /// <summary>Every file's name, in order.</summary>
    public static IReadOnlyList<string> Names { get; } =
    [
        .. typeof(TemplateFiles).Assembly.GetManifestResourceNames()
            .Where(name => name.StartsWith(Prefix, StringComparison.Ordinal)).Select(name => name[Prefix.Length..]).Order(StringComparer.Ordinal),
    ];

    /// <summary>The bytes of one of the files.</summary>
    /// <exception cref="ArgumentException">There is no such file.</exception>
    public static byte[] Read(string name)
    {
        using Stream stream = typeof(TemplateFiles).Assembly.GetManifestResourceStream(Prefix + name)
            ?? throw new ArgumentException($"There is no template {name}.", nameof(name));
        byte[] file = new byte[stream.Length];
        stream.ReadExactly(file);
        return file;
    }
}
