using Microsoft.Data.Sqlite;

namespace RebuildPlanner.Store;

/// <summary>The store cannot do what was asked: what happened, and what to do about it.</summary>
public sealed class StoreException(string message, Exception? inner = null) : Exception(message, inner)
{
    private const int Busy = 5, Locked = 6, ReadOnly = 8, Failed = 10, Damaged = 11, Full = 13, CannotOpen = 14, NoDatabase = 26;

    /// <summary>What an error of the database means to who stands at the bench.</summary>
    internal static StoreException Of(SqliteException problem, string path) => new(
        problem.SqliteErrorCode switch
        {
            Busy or Locked => $"{path}: another program has been writing to the store for too long. Nothing was written; close the other one or try again.",
            ReadOnly => $"{path}: the store may be read but not written. Nothing was written; look to the rights of the file and its folder.",
            Failed => $"{path}: the disk did not do what was asked ({problem.Message}). Nothing was written; look to the disk, then run store check.",
            Damaged => $"{path}: the store is damaged. Do not write to it; run store check, and restore the last backup.",
            Full => $"{path}: the disk is full. Nothing was written; make room and do it again.",
            CannotOpen => $"{path}: the store cannot be opened; look to the folder and its rights.",
            NoDatabase => $"{path}: this is not a store. Name the store's file, or restore a backup.",
            _ => $"{path}: {problem.Message}",
        },
        problem);
}
