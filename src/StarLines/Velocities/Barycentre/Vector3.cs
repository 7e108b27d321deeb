using System;

namespace StarLines.Velocities.Barycentre;

/// <summary>A vector of three doubles.</summary>
internal readonly record struct Vector3(double X, double Y, double Z)
{
    internal double Length => Math.Sqrt(Dot(this));

    public static Vector3 operator +(Vector3 a, Vector3 b) => new(a.X + b.X, a.Y + b.Y, a.Z + b.Z);

    public static Vector3 operator -(Vector3 a, Vector3 b) => new(a.X - b.X, a.Y - b.Y, a.Z - b.Z);

    public static Vector3 operator *(double factor, Vector3 a) => new(factor * a.X, factor * a.Y, factor * a.Z);

    internal double Dot(Vector3 b) => (X * b.X) + (Y * b.Y) + (Z * b.Z);

    internal Vector3 Unit() => (1.0 / Length) * this;
}
