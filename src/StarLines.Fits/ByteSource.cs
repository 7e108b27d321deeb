using System;
using System.Buffers;
using System.IO;
using Microsoft.Win32.SafeHandles;

namespace StarLines.Fits;

/// <summary>The bytes of a FITS file, in memory or read on demand.</summary>
internal abstract class ByteSource : IDisposable
{
    internal abstract long Length { get; }

    /// <summary>Whether reading costs no I/O.</summary>
    internal abstract bool InMemory { get; }

    /// <summary>The bytes from offset on; the caller has checked that they lie inside the file.</summary>
    internal abstract ReadOnlyMemory<byte> Read(long offset, int count);

    public abstract void Dispose();

    /// <summary>A file that was read whole.</summary>
    internal sealed class Memory(ReadOnlyMemory<byte> bytes) : ByteSource
    {
        internal override long Length => bytes.Length;

        internal override bool InMemory => true;

        internal override ReadOnlyMemory<byte> Read(long offset, int count) => bytes.Slice((int)offset, count);

        public override void Dispose()
        {
        }
    }

    /// <summary>A file that was read whole into a borrowed array, which goes back when the file is disposed: a fresh large array for each spectrum of many costs more than reading it.</summary>
    internal sealed class Pooled(byte[] bytes, int length) : ByteSource
    {
        private byte[]? bytes = bytes;

        internal override long Length => length;

        internal override bool InMemory => true;

        internal override ReadOnlyMemory<byte> Read(long offset, int count)
        {
            ObjectDisposedException.ThrowIf(bytes is null, typeof(FitsFile));
            return bytes.AsMemory(0, length).Slice((int)offset, count);
        }

        public override void Dispose()
        {
            if (bytes is not null)
            {
                ArrayPool<byte>.Shared.Return(bytes);
                bytes = null;
            }
        }
    }

    /// <summary>A large file, read piece by piece.</summary>
    internal sealed class Handle(SafeFileHandle handle, long length) : ByteSource
    {
        internal override long Length => length;

        internal override bool InMemory => false;

        internal override ReadOnlyMemory<byte> Read(long offset, int count)
        {
            byte[] bytes = GC.AllocateUninitializedArray<byte>(count);
            ReadExactly(handle, bytes, offset);
            return bytes;
        }

        public override void Dispose() => handle.Dispose();
    }

    internal static void ReadExactly(SafeFileHandle handle, Span<byte> bytes, long offset)
    {
        while (!bytes.IsEmpty)
        {
            int got = RandomAccess.Read(handle, bytes, offset);
            if (got == 0)
            {
                throw new EndOfStreamException("The file became shorter while it was read.");
            }

            bytes = bytes[got..];
            offset += got;
        }
    }
}
