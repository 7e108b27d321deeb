using System;
using System.Collections.Generic;

namespace StarLines.Templates;

/// <summary>Templates of one kind, of which the data choose the one that fits a star: that with the highest correlation.</summary>
public sealed class TemplateFamily
{
    private readonly LineTemplate[] _members;

    /// <summary>Makes a family.</summary>
    /// <param name="name">Name of the family, which stands in the table of velocities.</param>
    /// <param name="members">At least one template.</param>
    /// <exception cref="ArgumentException">There is no member.</exception>
    public TemplateFamily(string name, IReadOnlyCollection<LineTemplate> members)
    {
        ArgumentNullException.ThrowIfNull(name);
        ArgumentNullException.ThrowIfNull(members);
        if (members.Count == 0)
        {
            throw new ArgumentException("A family of templates needs at least one member.", nameof(members));
        }

        Name = name;
        _members = [.. members];
    }

    /// <summary>A family of one template, under its name.</summary>
    /// <param name="template">The template.</param>
    public TemplateFamily(LineTemplate template)
        : this((template ?? throw new ArgumentNullException(nameof(template))).Name, [template])
    {
    }

    /// <summary>Name of the family.</summary>
    public string Name { get; }

    /// <summary>The members.</summary>
    public IReadOnlyList<LineTemplate> Members => _members;
}
