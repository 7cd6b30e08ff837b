using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;

namespace PathPortal.Portal.Simulation;

/// <summary>Numbers with their bytes sorted by place, little-endian: high bytes of neighbours are alike and compress well beside each other.</summary>
internal static class BytePlanes
{
    public static void Write<T>(Stream stream, T[] values)
        where T : unmanaged
    {
        var size = Unsafe.SizeOf<T>();
        var bytes = MemoryMarshal.AsBytes(values.AsSpan());
        var plane = new byte[values.Length];
        for (var p = 0; p < size; p++)
        {
            for (var i = 0; i < plane.Length; i++)
                plane[i] = bytes[(i * size) + p];
            stream.Write(plane);
        }
    }

    public static T[] Read<T>(Stream stream, int count)
        where T : unmanaged
    {
        var size = Unsafe.SizeOf<T>();
        var values = new T[count];
        var bytes = MemoryMarshal.AsBytes(values.AsSpan());
        var plane = new byte[count];
        for (var p = 0; p < size; p++)
        {
            stream.ReadExactly(plane);
            for (var i = 0; i < plane.Length; i++)
                bytes[(i * size) + p] = plane[i];
        }
        return values;
    }
}
