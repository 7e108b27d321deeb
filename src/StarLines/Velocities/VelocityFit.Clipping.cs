using System;

namespace StarLines.Velocities;

/// <content>Single pixels that do not belong.</content>
internal sealed partial class VelocityFit
{
    /// <summary>Leaves out single pixels far off, such as cosmic-ray hits, in windows that do not fit.</summary>
    private void ClipPixels()
    {
        for (int g = 0; g < _windows.Length; g++)
        {
            ref WindowState state = ref _states[g];
            if (state.Fate != WindowFate.Used || state.Pixels < 8 || state.ChiSquare < state.Pixels + (4.0 * Math.Sqrt(2.0 * state.Pixels)))
            {
                continue;
            }

            int place = _place[g];
            int length = _windows[g].Length;
            Span<double> size = Work.Slice(place, length);
            var sorted = new double[length];
            int n = 0;
            double centre = 0.5 * (length - 1);
            for (int i = 0; i < length; i++)
            {
                double flux = 1.0 - (state.Depth * Template[place + i]);
                double shape = state.Level + (state.Tilt * (i - centre) / Math.Max(centre, 1.0));
                size[i] = Math.Abs(Absorption[place + i] - (state.Depth * Template[place + i]) + (shape * flux))
                    * Math.Sqrt(Weight[place + i]);
                if (Weight[place + i] > 0.0)
                {
                    sorted[n++] = size[i];
                }
            }

            Array.Sort(sorted, 0, n);
            double limit = PixelCut * Math.Max(1.0, 1.4826 * sorted[n / 2]);
            for (int i = 0; i < length; i++)
            {
                if (size[i] > limit)
                {
                    Weight[place + i] = 0.0;
                }
            }

            if (!Covered(g))
            {
                state.Fate = WindowFate.Masked;
            }
        }
    }
}
