using System;
using System.Collections.Generic;
using System.IO;
using System.Reflection;
using System.Reflection.Metadata;
using System.Reflection.PortableExecutable;

namespace StarLines.TestSupport;

/// <summary>What an assembly uses of others, read from its metadata.</summary>
internal sealed class AssemblyUses
{
    private AssemblyUses(HashSet<string> assemblies, HashSet<string> types, HashSet<string> members)
    {
        Assemblies = assemblies;
        Types = types;
        Members = members;
    }

    /// <summary>Names of the assemblies it refers to.</summary>
    public IReadOnlyCollection<string> Assemblies { get; }

    /// <summary>Full names of the types of others that it refers to.</summary>
    public IReadOnlyCollection<string> Types { get; }

    /// <summary>Members of others that it refers to, as <c>Namespace.Type.member</c>.</summary>
    public IReadOnlyCollection<string> Members { get; }

    /// <summary>Reads the references of an assembly.</summary>
    public static AssemblyUses Of(Assembly assembly)
    {
        using FileStream stream = File.OpenRead(assembly.Location);
        using var image = new PEReader(stream);
        MetadataReader reader = image.GetMetadataReader();
        var assemblies = new HashSet<string>(StringComparer.Ordinal);
        var types = new HashSet<string>(StringComparer.Ordinal);
        var members = new HashSet<string>(StringComparer.Ordinal);
        foreach (AssemblyReferenceHandle handle in reader.AssemblyReferences)
        {
            assemblies.Add(reader.GetString(reader.GetAssemblyReference(handle).Name));
        }

        foreach (TypeReferenceHandle handle in reader.TypeReferences)
        {
            types.Add(FullName(reader, handle));
        }

        foreach (MemberReferenceHandle handle in reader.MemberReferences)
        {
            MemberReference member = reader.GetMemberReference(handle);
            if (member.Parent.Kind == HandleKind.TypeReference)
            {
                members.Add(FullName(reader, (TypeReferenceHandle)member.Parent) + "." + reader.GetString(member.Name));
            }
        }

        return new AssemblyUses(assemblies, types, members);
    }

    private static string FullName(MetadataReader reader, TypeReferenceHandle handle)
    {
        TypeReference type = reader.GetTypeReference(handle);
        string name = reader.GetString(type.Name);
        string space = reader.GetString(type.Namespace);
        return space.Length == 0 ? name : space + "." + name;
    }
}
