using System.Collections.Generic;
using Tomlyn.Syntax;

namespace StarLines.Runs.Plans;

/// <summary>A value in a plan's file, with its place for messages.</summary>
internal sealed class PlanValue(string where, string key, ValueSyntax? value)
{
    internal string Text() => value is StringValueSyntax text && text.Value is { } read ? read : throw Wrong("text between quotes");

    internal bool Truth() => value is BooleanValueSyntax truth ? truth.Value : throw Wrong("true or false");

    internal double Number() => value switch
    {
        IntegerValueSyntax whole => whole.Value,
        FloatValueSyntax real when double.IsFinite(real.Value) => real.Value,
        _ => throw Wrong("a number"),
    };

    internal int Count() => value is IntegerValueSyntax { Value: >= 0 and <= int.MaxValue } whole
        ? (int)whole.Value
        : throw Wrong("a whole number from 0 up");

    /// <summary>Several texts; one alone need not stand between brackets.</summary>
    internal IReadOnlyList<string> Texts()
    {
        if (value is not ArraySyntax array)
        {
            return [Text()];
        }

        var texts = new List<string>();
        foreach (ArrayItemSyntax item in array.Items)
        {
            texts.Add(new PlanValue(where, key, item.Value).Text());
        }

        return texts;
    }

    internal RunPlanException Wrong(string expected) => new($"{where}: {key} must be {expected}.");
}
