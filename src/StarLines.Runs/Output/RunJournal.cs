using System;
using System.IO;
using System.Text.Json;
using System.Threading;

namespace StarLines.Runs.Output;

/// <summary>The journal of a run: one line of JSON an input, appended as the input ends; used by several threads.</summary>
internal sealed class RunJournal : IDisposable
{
    private readonly FileStream _file;
    private readonly Lock _gate = new();

    internal RunJournal(string path)
    {
        _file = new FileStream(path, FileMode.Create, FileAccess.Write, FileShare.Read);
    }

    /// <summary>Appends a line for an input and puts it on the disk.</summary>
    internal void Append(InputResult result)
    {
        using var line = new MemoryStream();
        using (var json = new Utf8JsonWriter(line))
        {
            json.WriteStartObject();
            json.WriteString("file", result.Input.Name);
            json.WriteString("sha256", result.Sha256);
            json.WriteString("state", result.State);
            json.WriteNumber("spectra", result.Spectra.Count);
            json.WriteNumber("seconds", Math.Round(result.Seconds, 3));
            json.WriteString("error", result.Error);
            json.WriteStartArray("outputs");
            foreach (string file in result.Files)
            {
                json.WriteStringValue(file);
            }

            json.WriteEndArray();
            json.WriteEndObject();
        }

        line.WriteByte((byte)'\n');
        lock (_gate)
        {
            _file.Write(line.GetBuffer(), 0, (int)line.Length);
            _file.Flush();
        }
    }

    /// <inheritdoc/>
    public void Dispose() => _file.Dispose();
}
