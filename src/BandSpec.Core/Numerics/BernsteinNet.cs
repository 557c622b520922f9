namespace BandSpec.Core.Numerics;

/// <summary>
/// A polynomial in two variables on a rectangle by its Bernstein coefficients. The smallest and the largest coefficient enclose every value
/// on the rectangle, the four corner coefficients are the values at its corners, and with each halving the enclosure tightens by a quarter
/// (Farouki 2012, "The Bernstein polynomial basis: a centennial retrospective", sections 3 and 5).
/// </summary>
internal sealed class BernsteinNet
{
    private readonly int rows;
    private readonly int columns;
    private readonly double[] net;

    private BernsteinNet(int rows, int columns, double[] net) => (this.rows, this.columns, this.net) = (rows, columns, net);

    /// <summary>The coefficients, the last of a row beside the first of the next; a row runs along <c>t</c>.</summary>
    public ReadOnlySpan<double> Coefficients => net;

    /// <summary>The net of a surface on the unit square, raised to the degrees asked for.</summary>
    /// <param name="surface">The surface.</param>
    /// <param name="degreeInX">At least its own degree in <c>x</c>.</param>
    /// <param name="degreeInT">At least its own degree in <c>t</c>.</param>
    public static BernsteinNet Of(Surface surface, int degreeInX, int degreeInT)
    {
        (int rows, int columns) = (degreeInX + 1, degreeInT + 1);
        var net = new double[rows * columns];
        for (int i = 0; i < rows; i++)
            for (int k = 0; k < columns; k++)
                net[(i * columns) + k] = Coefficient(surface, i, k, degreeInX, degreeInT);
        return new BernsteinNet(rows, columns, net);
    }

    /// <summary>The value at a corner of the rectangle.</summary>
    public double Corner(bool upperX, bool upperT) => net[(upperX ? (rows - 1) * columns : 0) + (upperT ? columns - 1 : 0)];

    /// <summary>The largest step between neighbouring coefficients along one of the variables.</summary>
    public double LargestStep(bool alongX)
    {
        double largest = 0;
        int along = alongX ? columns : 1;
        for (int at = 0; at + along < net.Length; at++)
            if (alongX || (at + 1) % columns != 0)
                largest = Math.Max(largest, Math.Abs(net[at + along] - net[at]));
        return largest;
    }

    /// <summary>The nets of the two halves, lower first, by de Casteljau's rule.</summary>
    public (BernsteinNet Lower, BernsteinNet Upper) Halve(bool alongX)
    {
        var lower = new double[net.Length];
        double[] upper = [.. net];
        (int lines, int length, int across, int along) = alongX ? (columns, rows, 1, columns) : (rows, columns, columns, 1);
        for (int line = 0; line < lines; line++)
            for (int step = 0; step < length; step++)
            {
                lower[(line * across) + (step * along)] = upper[line * across];
                for (int i = 0; i < length - 1 - step; i++)
                {
                    int at = (line * across) + (i * along);
                    upper[at] = (upper[at] + upper[at + along]) / 2;
                }
            }

        return (new BernsteinNet(rows, columns, lower), new BernsteinNet(rows, columns, upper));
    }

    /// <summary><c>b_ik = Σ C(i,r)C(k,s)/(C(p,r)C(q,s)) · c_rs</c>.</summary>
    private static double Coefficient(Surface surface, int i, int k, int degreeInX, int degreeInT)
    {
        double sum = 0, ofX = 1;
        for (int r = 0; r <= i; r++)
        {
            double ofT = 1;
            for (int s = 0; s <= k; s++)
            {
                sum += ofX * ofT * surface[r, s];
                ofT *= (double)(k - s) / (degreeInT - s);
            }

            ofX *= (double)(i - r) / (degreeInX - r);
        }

        return sum;
    }
}
