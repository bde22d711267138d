using System.Globalization;
using Microsoft.Data.Sqlite;

namespace RebuildPlanner.Store;

/// <summary>The store's schema: numbered scripts, each run once, in order. The file's <c>user_version</c> is the last one run.</summary>
internal static class Schema
{
    /// <summary>What marks a file as a store, in its <c>application_id</c>: "RbPl".</summary>
    public const int ApplicationId = 0x5262506C;

    /// <summary>The version this program writes: the number of the last script.</summary>
    public const int Version = 2;

    /// <summary>The scripts in order; read when a file is made or brought up to date, which is seldom.</summary>
    public static IReadOnlyList<string> Scripts() =>
    [
        .. typeof(Schema).Assembly.GetManifestResourceNames().Where(name => name.EndsWith(".sql", StringComparison.Ordinal)).Order(StringComparer.Ordinal).Select(Text),
    ];

    /// <summary>Brings an empty or older file up to date, in one transaction.</summary>
    public static void Upgrade(SqliteConnection connection, int from)
    {
        IReadOnlyList<string> scripts = Scripts();
        using SqliteTransaction transaction = connection.BeginTransaction();

        // Another program may have been first.
        for (int version = Math.Max(from, (int)Sql.Scalar(connection, "PRAGMA user_version")); version < Version; version++)
        {
            Sql.Run(connection, scripts[version]);
        }

        Sql.Run(connection, string.Create(CultureInfo.InvariantCulture, $"PRAGMA application_id = {ApplicationId}; PRAGMA user_version = {Version};"));
        transaction.Commit();
    }

    private static string Text(string name)
    {
        using StreamReader reader = new(typeof(Schema).Assembly.GetManifestResourceStream(name)!);
        return reader.ReadToEnd();
    }
}
