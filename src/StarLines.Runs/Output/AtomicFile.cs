using System;
using System.IO;

namespace StarLines.Runs.Output;

/// <summary>Writes a file beside its place and moves it there when it is whole, so that nobody meets half a file.</summary>
internal static class AtomicFile
{
    /// <summary>Writes a file; its folder is made, an old file is replaced, and a failure leaves nothing.</summary>
    internal static void Write(string path, Action<Stream> write)
    {
        string full = Path.GetFullPath(path);
        string folder = Path.GetDirectoryName(full)!;
        Directory.CreateDirectory(folder);
        string beside = Path.Combine(folder, $".{Path.GetFileName(full)}.{Environment.ProcessId}.part");
        try
        {
            using (FileStream stream = File.Create(beside))
            {
                write(stream);
            }

            File.Move(beside, full, overwrite: true);
        }
        catch
        {
            File.Delete(beside);
            throw;
        }
    }
}
