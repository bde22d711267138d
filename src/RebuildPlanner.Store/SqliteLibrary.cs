using System.Reflection;
using System.Runtime.InteropServices;
using SQLitePCL;

namespace RebuildPlanner.Store;

/// <summary>Where SQLite itself is: beside the program, if it was delivered so.</summary>
/// <remarks>Asked for by its bare name, it is sought in some hundred places of the system first: a twentieth of a short command, and a stranger's could be found.</remarks>
internal static class SqliteLibrary
{
    private const string Name = "e_sqlite3";

    private static int _told;

    /// <summary>Tells the binding to look beside the program first. To be called before a connection is made; again does nothing.</summary>
    public static void SeekBesideProgram()
    {
        if (Interlocked.Exchange(ref _told, 1) == 0)
        {
            NativeLibrary.SetDllImportResolver(typeof(SQLite3Provider_e_sqlite3).Assembly, Beside);
        }
    }

    // Zero, and the system looks as it would have.
    private static nint Beside(string name, Assembly by, DllImportSearchPath? path)
    {
        string file = OperatingSystem.IsWindows() ? $"{Name}.dll" : OperatingSystem.IsMacOS() ? $"lib{Name}.dylib" : $"lib{Name}.so";
        return name == Name && NativeLibrary.TryLoad(Path.Combine(AppContext.BaseDirectory, file), out nint library) ? library : 0;
    }
}
