using System;
using System.Collections;
using System.Collections.Generic;
using System.Diagnostics.CodeAnalysis;

namespace StarLines.Tables;

/// <summary>Named values that belong to a table, in the order they were added; names are told apart by case.</summary>
public sealed class TableMetadata : IEnumerable<KeyValuePair<string, MetadataValue>>
{
    private readonly OrderedDictionary<string, MetadataValue> _entries = new(StringComparer.Ordinal);

    /// <summary>Number of entries.</summary>
    public int Count => _entries.Count;

    /// <summary>The value of a name; setting a name that is there keeps its place.</summary>
    /// <param name="key">The name.</param>
    /// <returns>The value.</returns>
    /// <exception cref="KeyNotFoundException">The name is not there.</exception>
    public MetadataValue this[string key]
    {
        get => _entries[key];
        set
        {
            ArgumentNullException.ThrowIfNull(value);
            _entries[key] = value;
        }
    }

    /// <summary>Appends an entry.</summary>
    /// <param name="key">The name, not yet there.</param>
    /// <param name="value">The value.</param>
    /// <exception cref="ArgumentException">The name is there already.</exception>
    public void Add(string key, MetadataValue value)
    {
        ArgumentNullException.ThrowIfNull(key);
        ArgumentNullException.ThrowIfNull(value);
        _entries.Add(key, value);
    }

    /// <summary>Says whether a name is there, and its value.</summary>
    /// <param name="key">The name.</param>
    /// <param name="value">Receives the value.</param>
    /// <returns>True where the name is there.</returns>
    public bool TryGetValue(string key, [NotNullWhen(true)] out MetadataValue? value) => _entries.TryGetValue(key, out value);

    /// <summary>The text of a scalar entry whose name is compared without case.</summary>
    /// <param name="key">The name.</param>
    /// <returns>The text; empty where the name is not there.</returns>
    public string TextOf(string key)
    {
        foreach ((string name, MetadataValue value) in _entries)
        {
            if (name.Equals(key, StringComparison.OrdinalIgnoreCase))
            {
                return value.Text;
            }
        }

        return "";
    }

    /// <summary>Removes an entry.</summary>
    /// <param name="key">The name.</param>
    /// <returns>True where the name was there.</returns>
    public bool Remove(string key) => _entries.Remove(key);

    /// <inheritdoc/>
    public IEnumerator<KeyValuePair<string, MetadataValue>> GetEnumerator() =>
        ((IEnumerable<KeyValuePair<string, MetadataValue>>)_entries).GetEnumerator();

    IEnumerator IEnumerable.GetEnumerator() => GetEnumerator();

    /// <inheritdoc/>
    public override string ToString()
    {
        var parts = new List<string>(Count);
        foreach ((string name, MetadataValue value) in _entries)
        {
            parts.Add($"{name}: {value}");
        }

        return "{" + string.Join(", ", parts) + "}";
    }
}
