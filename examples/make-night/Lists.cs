using System;
using System.Collections.Generic;
using System.IO;
using StarLines.LineLists;
using StarLines.Tables;

namespace StarLines.Examples.MakeNight;

internal static class Lists
{
    public static LineList Read(string name)
    {
        using FileStream s = File.OpenRead("linelists/" + name + ".ecsv");
        Table t = TableReader.Read(s);
        var lines = new List<RestLine>();
        for (int i = 0; i < t.RowCount; i++)
        {
            lines.Add(new RestLine
            {
                Name = t["line"].Texts[i]!, Species = t["species"].Texts[i]!, WavelengthAngstrom = t["wavelength"].ToDoubles()[i],
                LowerEnergyEv = t.TryFind("lower_energy", out TableColumn? e) ? e.ToDoubles()[i] : double.NaN,
                LogGf = t.TryFind("log_gf", out TableColumn? g) ? g.ToDoubles()[i] : double.NaN,
            });
        }

        return new LineList(name, Medium.Air, lines);
    }
}
