using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace BandSpec.Core.Numerics.Dense;

/// <summary>Products and sums of small dense matrices. Sums run in a fixed order, so the answer is the same to the last bit everywhere.</summary>
internal static class Products
{
    /// <summary>
    /// <c>target += factor·source</c>, four cells at a time. Every cell is one product and one sum whatever the machine's width, so the bits
    /// do not depend on it; this is where nine tenths of the estimation's time goes.
    /// </summary>
    public static void AddTo(Span<double> target, double factor, ReadOnlySpan<double> source)
    {
        ref double into = ref MemoryMarshal.GetReference(target);
        ref double from = ref MemoryMarshal.GetReference(source[..target.Length]);
        Vector256<double> factors = Vector256.Create(factor);
        int i = 0;
        for (; i <= target.Length - Vector256<double>.Count; i += Vector256<double>.Count)
            (Vector256.LoadUnsafe(ref into, (nuint)i) + (factors * Vector256.LoadUnsafe(ref from, (nuint)i))).StoreUnsafe(ref into, (nuint)i);
        for (; i < target.Length; i++)
            target[i] += factor * source[i];
    }

    /// <summary><c>target += factor·source</c>, cell by cell.</summary>
    public static void AddTo(Grid target, double factor, Grid source) => AddTo(target.AllCells(), factor, source.AllCells());

    /// <summary><c>A·B</c>.</summary>
    public static Grid Times(this Grid a, Grid b)
    {
        Grid product = new(a.Rows, b.Columns);
        for (int i = 0; i < a.Rows; i++)
        {
            Span<double> row = product.Row(i);
            ReadOnlySpan<double> factors = a.Row(i);
            for (int k = 0; k < factors.Length; k++)
                if (factors[k] != 0)
                    AddTo(row, factors[k], b.Row(k));
        }

        return product;
    }

    /// <summary><c>A·Bᵀ</c>.</summary>
    public static Grid TimesTransposed(this Grid a, Grid b)
    {
        Grid product = new(a.Rows, b.Rows);
        for (int i = 0; i < a.Rows; i++)
            for (int j = 0; j < b.Rows; j++)
                product[i, j] = Vectors.Dot(a.Row(i), b.Row(j));
        return product;
    }

    /// <summary><c>AᵀA</c>, both halves.</summary>
    public static Grid Gram(this Grid a)
    {
        Grid gram = new(a.Columns, a.Columns);
        for (int i = 0; i < a.Rows; i++)
        {
            ReadOnlySpan<double> row = a.Row(i);
            for (int j = 0; j < row.Length; j++)
                if (row[j] != 0)
                    AddTo(gram.Row(j)[j..], row[j], row[j..]);
        }

        for (int j = 0; j < gram.Rows; j++)
            for (int k = 0; k < j; k++)
                gram[j, k] = gram[k, j];
        return gram;
    }

    /// <summary><c>A·v</c>.</summary>
    public static double[] Times(this Grid a, ReadOnlySpan<double> vector)
    {
        double[] product = new double[a.Rows];
        for (int i = 0; i < a.Rows; i++)
            product[i] = Vectors.Dot(a.Row(i), vector);
        return product;
    }

    /// <summary>The trace of <c>A·B</c> for symmetric <c>A</c> and <c>B</c> of one size.</summary>
    public static double TraceOfProduct(Grid a, Grid b) => Vectors.Dot(a.AllCells(), b.AllCells());
}
