using System;
using System.Buffers;
using System.Buffers.Text;
using System.IO;
using System.Text;

namespace StarLines.Tables.Delimited;

/// <summary>Gathers UTF-8 bytes and hands them to a stream in blocks.</summary>
internal sealed class Utf8Output : IDisposable
{
    private const int BlockSize = 1 << 16;

    private readonly Stream _stream;
    private byte[] _block = ArrayPool<byte>.Shared.Rent(BlockSize);
    private int _used;

    internal Utf8Output(Stream stream) => _stream = stream;

    internal void Byte(byte value)
    {
        Reserve(1);
        _block[_used++] = value;
    }

    internal void Bytes(ReadOnlySpan<byte> bytes)
    {
        if (bytes.Length > BlockSize)
        {
            Flush();
            _stream.Write(bytes);
            return;
        }

        Reserve(bytes.Length);
        bytes.CopyTo(_block.AsSpan(_used));
        _used += bytes.Length;
    }

    internal void Text(ReadOnlySpan<char> text)
    {
        const int Piece = 8192;
        while (text.Length > 0)
        {
            int length = Math.Min(Piece, text.Length);
            if (length < text.Length && char.IsHighSurrogate(text[length - 1]))
            {
                length--;
            }

            Reserve(3 * length);
            _used += Encoding.UTF8.GetBytes(text[..length], _block.AsSpan(_used));
            text = text[length..];
        }
    }

    internal void Number(double value, TableColumn column)
    {
        Reserve(NumberText.MaximumLength);
        _used += NumberText.Write(value, column, _block.AsSpan(_used));
    }

    internal void Number(long value)
    {
        Reserve(20);
        Utf8Formatter.TryFormat(value, _block.AsSpan(_used), out int written);
        _used += written;
    }

    internal void Spaces(int count)
    {
        for (int i = 0; i < count; i++)
        {
            Byte((byte)' ');
        }
    }

    internal void Flush()
    {
        _stream.Write(_block, 0, _used);
        _used = 0;
    }

    public void Dispose()
    {
        ArrayPool<byte>.Shared.Return(_block);
        _block = [];
    }

    private void Reserve(int count)
    {
        if (_used + count > _block.Length)
        {
            Flush();
        }
    }
}
