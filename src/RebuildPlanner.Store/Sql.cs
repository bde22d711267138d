using Microsoft.Data.Sqlite;

namespace RebuildPlanner.Store;

/// <summary>Plain SQL with named parameters; what is run stands in the code that runs it.</summary>
internal static class Sql
{
    /// <summary>Runs a statement; how many rows it touched.</summary>
    public static int Run(SqliteConnection connection, string sql, params ReadOnlySpan<(string Name, object? Value)> values)
    {
        using SqliteCommand command = Command(connection, sql, values);
        return command.ExecuteNonQuery();
    }

    /// <summary>The one whole number a query gives.</summary>
    public static long Scalar(SqliteConnection connection, string sql, params ReadOnlySpan<(string Name, object? Value)> values)
    {
        using SqliteCommand command = Command(connection, sql, values);
        return (long)command.ExecuteScalar()!;
    }

    /// <summary>The rows of a query.</summary>
    public static List<T> Rows<T>(SqliteConnection connection, string sql, Func<SqliteDataReader, T> row, params ReadOnlySpan<(string Name, object? Value)> values)
    {
        using SqliteCommand command = Command(connection, sql, values);
        using SqliteDataReader reader = command.ExecuteReader();
        List<T> rows = [];
        while (reader.Read())
        {
            rows.Add(row(reader));
        }

        return rows;
    }

    /// <summary>A text column that may be null.</summary>
    public static string? Text(this SqliteDataReader reader, int column) => reader.IsDBNull(column) ? null : reader.GetString(column);

    private static SqliteCommand Command(SqliteConnection connection, string sql, ReadOnlySpan<(string Name, object? Value)> values)
    {
        SqliteCommand command = connection.CreateCommand();
        command.CommandText = sql;
        foreach ((string name, object? value) in values)
        {
            command.Parameters.AddWithValue("@" + name, value ?? DBNull.Value);
        }

        return command;
    }
}
