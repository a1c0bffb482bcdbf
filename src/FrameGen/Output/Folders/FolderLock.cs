namespace FrameGen.Output.Folders;

/// <summary>Keeps two programs from writing to one folder at once.</summary>
internal static class FolderLock
{
    private const int Tries = 50;
    private const int PauseMilliseconds = 100;

    /// <summary>Takes the lock, waiting up to five seconds for another program; it goes with the stream, or with the program.</summary>
    /// <param name="path">The lock file, made and removed here.</param>
    /// <param name="folder">What is locked, for the message.</param>
    /// <exception cref="IOException">Another program holds it, or nothing can be written there.</exception>
    public static FileStream Take(string path, string folder)
    {
        for (int left = Tries; ; left--)
        {
            try
            {
                return new FileStream(path, FileMode.OpenOrCreate, FileAccess.ReadWrite, FileShare.None, bufferSize: 1, FileOptions.DeleteOnClose);
            }
            catch (IOException e) when (e is not (DirectoryNotFoundException or FileNotFoundException or PathTooLongException) && File.Exists(path))
            {
                if (left == 0)
                {
                    throw new IOException($"another build is writing to {folder}; try again when it is done", e);
                }

                Thread.Sleep(PauseMilliseconds);
            }
            catch (Exception e) when (e is IOException or UnauthorizedAccessException)
            {
                throw new IOException($"can't write beside {folder}: {e.Message}", e);
            }
        }
    }
}
