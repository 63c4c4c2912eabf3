namespace IceExtent.Statistics;

/// <summary>Rows and columns of blocks, both ends included, outside which all weights are zero: small regions cost little.</summary>
internal readonly record struct BlockWindow(int FirstRow, int LastRow, int FirstColumn, int LastColumn)
{
    /// <summary>The number of columns.</summary>
    public int Columns => LastColumn - FirstColumn + 1;
}
