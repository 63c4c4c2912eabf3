using System.Buffers.Binary;
using System.Text;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Verifies an object header of the newer kind with all its continuations. Source: [HDF5] section IV.A.</summary>
internal static class ObjectHeaderCheck
{
    private const int MostContinuations = 1000;
    private const byte LinkMessage = 0x06;
    private const byte ContinuationMessage = 0x10;

    /// <summary>Verifies the checksums, and that no soft link kept in the header leads to a soft link.</summary>
    /// <exception cref="InvalidDataException">The header is damaged.</exception>
    public static void Verify(BlockReader blocks, long start)
    {
        ReadOnlySpan<byte> head = blocks.Plain(start, 6);
        if (head[4] != 2)
        {
            return; // The library refuses it.
        }

        byte flags = head[5];
        int sizeAt = 6 + ((flags & 0x20) != 0 ? 16 : 0) + ((flags & 0x10) != 0 ? 4 : 0);
        int sizeBytes = 1 << (flags & 3);
        long messages = WholeNumber(blocks.Plain(start, sizeAt + sizeBytes)[sizeAt..]);
        int messageHead = 4 + ((flags & 0x04) != 0 ? 2 : 0);
        Queue<(long Start, long Bytes)> continuations = new();
        Dictionary<string, string> softLinks = new(StringComparer.Ordinal);
        long prefix = sizeAt + sizeBytes;
        ReadOnlySpan<byte> block = blocks.Checked(start, checked(prefix + messages + sizeof(uint)));
        Collect(block[(int)prefix..^sizeof(uint)], messageHead, continuations, softLinks);
        for (int followed = 0; continuations.TryDequeue(out (long Start, long Bytes) next); followed++)
        {
            if (followed == MostContinuations)
            {
                throw new InvalidDataException("The continuations of a header lead in circles.");
            }

            block = blocks.Checked(next.Start, next.Bytes);
            Collect(block[sizeof(uint)..^sizeof(uint)], messageHead, continuations, softLinks);
        }

        RefuseChains(softLinks);
    }

    private static void Collect(
        ReadOnlySpan<byte> messages,
        int messageHead,
        Queue<(long Start, long Bytes)> continuations,
        Dictionary<string, string> softLinks)
    {
        while (messages.Length >= messageHead)
        {
            int bytes = BinaryPrimitives.ReadUInt16LittleEndian(messages[1..]);
            if (bytes > messages.Length - messageHead)
            {
                throw new InvalidDataException("A message is longer than the header that holds it.");
            }

            ReadOnlySpan<byte> message = messages.Slice(messageHead, bytes);
            if (messages[0] == ContinuationMessage && bytes >= 16)
            {
                continuations.Enqueue((BinaryPrimitives.ReadInt64LittleEndian(message), BinaryPrimitives.ReadInt64LittleEndian(message[8..])));
            }
            else if (messages[0] == LinkMessage && SoftLink(message) is var (name, target))
            {
                softLinks[name] = target;
            }

            messages = messages[(messageHead + bytes)..];
        }
    }

    // Version, flags, then as the flags say: type, creation order, character set; the name's length, the name, the target.
    private static (string Name, string Target)? SoftLink(ReadOnlySpan<byte> message)
    {
        const byte Soft = 1;
        if (message.Length < 3 || (message[1] & 0x08) == 0 || message[2] != Soft)
        {
            return null;
        }

        byte flags = message[1];
        int at = 3 + ((flags & 0x04) != 0 ? 8 : 0) + ((flags & 0x10) != 0 ? 1 : 0);
        int sizeBytes = 1 << (flags & 3);
        int nameBytes = checked((int)WholeNumber(message.Slice(at, sizeBytes)));
        at += sizeBytes;
        string name = Encoding.UTF8.GetString(message.Slice(at, nameBytes));
        at += nameBytes;
        int targetBytes = BinaryPrimitives.ReadUInt16LittleEndian(message[at..]);
        return (name, Encoding.UTF8.GetString(message.Slice(at + 2, targetBytes)));
    }

    private static long WholeNumber(ReadOnlySpan<byte> bytes) => bytes.Length switch
    {
        1 => bytes[0],
        2 => BinaryPrimitives.ReadUInt16LittleEndian(bytes),
        4 => BinaryPrimitives.ReadUInt32LittleEndian(bytes),
        _ => BinaryPrimitives.ReadInt64LittleEndian(bytes),
    };

    // The library follows links of this kind without reading the file, so nothing else would stop it.
    private static void RefuseChains(Dictionary<string, string> softLinks)
    {
        if (softLinks.Values.Any(target => target.Split('/').Any(softLinks.ContainsKey)))
        {
            throw new InvalidDataException("A soft link leads to a soft link.");
        }
    }
}
