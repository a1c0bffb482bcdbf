using System.Runtime.InteropServices;

namespace FrameGen.Output.Folders;

/// <summary>Exchanges two folders in one step, where the system can.</summary>
internal static partial class FolderExchange
{
    private const int CurrentFolder = -100; // AT_FDCWD
    private const uint Exchange = 2;        // RENAME_EXCHANGE
    private const int NotPermittedAcrossDevices = 18; // EXDEV: some layered file systems say so of older folders
    private const int NotKnown = 22;        // EINVAL: the file system can't exchange
    private const int NoSuchCall = 38;      // ENOSYS
    private const int NotSupported = 95;    // EOPNOTSUPP

    /// <summary>Exchanges the names of two folders that exist, in one file system.</summary>
    /// <returns>False where the system or the file system has no such step; then nothing has changed.</returns>
    /// <exception cref="IOException">The system has it and refused.</exception>
    public static bool Try(string one, string other)
    {
        if (!OperatingSystem.IsLinux())
        {
            return false;
        }

        try
        {
            if (RenameAt2(CurrentFolder, one, CurrentFolder, other, Exchange) == 0)
            {
                return true;
            }
        }
        catch (EntryPointNotFoundException)
        {
            return false; // an older C library
        }

        int error = Marshal.GetLastPInvokeError();
        return error is NotKnown or NoSuchCall or NotSupported or NotPermittedAcrossDevices
            ? false
            : throw new IOException($"can't exchange {one} and {other}: {Marshal.GetPInvokeErrorMessage(error)}");
    }

    [LibraryImport("libc", EntryPoint = "renameat2", SetLastError = true, StringMarshalling = StringMarshalling.Utf8)]
    [DefaultDllImportSearchPaths(DllImportSearchPath.SafeDirectories)]
    private static partial int RenameAt2(int oldFolder, string oldPath, int newFolder, string newPath, uint flags);
}
