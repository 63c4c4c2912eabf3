using System.Buffers.Binary;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Checks an object header of the older kind, which has no checksum: no message may claim more bytes than it has.</summary>
/// <remarks>Source: [HDF5] sections IV.A.1.a and IV.A.2. A header of the newer kind is left to <see cref="ObjectHeaderCheck"/>.</remarks>
internal static class OldHeaderCheck
{
    private const int HeadBytes = 16;
    private const int MessageHeadBytes = 8;
    private const int MostContinuations = 1000;
    private const int LargestNumber = 1 << 16;

    /// <summary>Checks the sizes in all messages of a header.</summary>
    /// <exception cref="InvalidDataException">The header is damaged.</exception>
    public static void Verify(BlockReader blocks, long start)
    {
        ReadOnlySpan<byte> head = blocks.Plain(start, HeadBytes);
        if (head[0] != 1)
        {
            return;
        }

        Queue<(long Start, long Bytes)> pieces = new();
        pieces.Enqueue((start + HeadBytes, BinaryPrimitives.ReadUInt32LittleEndian(head[8..])));
        for (int followed = 0; pieces.TryDequeue(out (long Start, long Bytes) piece); followed++)
        {
            if (followed == MostContinuations)
            {
                throw new InvalidDataException("The continuations of a header lead in circles.");
            }

            if (piece.Bytes >= MessageHeadBytes)
            {
                CheckPiece(blocks.Plain(piece.Start, piece.Bytes), pieces);
            }
        }
    }

    private static void CheckPiece(ReadOnlySpan<byte> messages, Queue<(long Start, long Bytes)> pieces)
    {
        while (messages.Length >= MessageHeadBytes)
        {
            int type = BinaryPrimitives.ReadUInt16LittleEndian(messages);
            int bytes = BinaryPrimitives.ReadUInt16LittleEndian(messages[2..]);
            bool isShared = (messages[4] & 2) != 0;
            if (bytes > messages.Length - MessageHeadBytes)
            {
                throw new InvalidDataException("A message is longer than the header that holds it.");
            }

            ReadOnlySpan<byte> message = messages.Slice(MessageHeadBytes, bytes);
            switch (type)
            {
                case 0x03 when !isShared:
                    CheckDatatype(message);
                    break;
                case 0x04 when !isShared && BinaryPrimitives.ReadUInt32LittleEndian(message) > (uint)bytes:
                    throw new InvalidDataException("A fill value is longer than its message.");
                case 0x05 when !isShared:
                    CheckFillValue(message);
                    break;
                case 0x0C when !isShared:
                    CheckAttribute(message);
                    break;
                case 0x10:
                    pieces.Enqueue((BinaryPrimitives.ReadInt64LittleEndian(message), BinaryPrimitives.ReadInt64LittleEndian(message[8..])));
                    break;
                default:
                    break;
            }

            messages = messages[(MessageHeadBytes + bytes)..];
        }
    }

    // Numbers, short texts and records: what a variable's element takes.
    private static uint CheckDatatype(ReadOnlySpan<byte> message)
    {
        uint size = BinaryPrimitives.ReadUInt32LittleEndian(message[4..]);
        return size <= LargestNumber ? size : throw new InvalidDataException($"A number claims {size} bytes.");
    }

    // Versions 1 and 2: four bytes, then the size where a value is there; version 3: flags, then the size.
    private static void CheckFillValue(ReadOnlySpan<byte> message)
    {
        bool hasSize = message[0] switch
        {
            1 => true,
            2 => message[3] != 0,
            _ => (message[1] & 0x20) != 0,
        };
        int sizeAt = message[0] == 3 ? 2 : 4;
        if (hasSize && BinaryPrimitives.ReadUInt32LittleEndian(message[sizeAt..]) > (uint)message.Length)
        {
            throw new InvalidDataException("A fill value is longer than its message.");
        }
    }

    // Name, type, shape and data follow each other, in version 1 each filled up to eight bytes.
    private static void CheckAttribute(ReadOnlySpan<byte> message)
    {
        int version = message[0];
        bool typeIsShared = version > 1 && (message[1] & 1) != 0;
        int nameBytes = Filled(BinaryPrimitives.ReadUInt16LittleEndian(message[2..]), version);
        int typeBytes = Filled(BinaryPrimitives.ReadUInt16LittleEndian(message[4..]), version);
        int shapeBytes = Filled(BinaryPrimitives.ReadUInt16LittleEndian(message[6..]), version);
        int typeAt = (version == 3 ? 9 : 8) + nameBytes;
        if (typeIsShared)
        {
            return;
        }

        ulong bytes = CheckDatatype(message[typeAt..]);
        ReadOnlySpan<byte> shape = message[(typeAt + typeBytes)..];
        int rank = shape[1];
        int lengthsAt = shape[0] == 1 ? 8 : 4;
        for (int axis = 0; axis < rank; axis++)
        {
            bytes = checked(bytes * BinaryPrimitives.ReadUInt64LittleEndian(shape[(lengthsAt + (8 * axis))..]));
        }

        if (bytes > (ulong)(message.Length - typeAt - typeBytes - shapeBytes))
        {
            throw new InvalidDataException("An attribute is longer than its message.");
        }
    }

    private static int Filled(int bytes, int version) => version == 1 ? (bytes + 7) / 8 * 8 : bytes;
}
