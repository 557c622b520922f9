using BandSpec.Core.Numerics.Dense;

namespace BandSpec.Core.Numerics.NestedModels;

/// <summary>
/// The expected information of restricted likelihood about the variances of independent coefficients within lots and between lots and about
/// the residual variance: <c>I_ab = ½ tr(P V_a P V_b)</c> (Searle, Casella &amp; McCulloch, Variance Components, 1992, section 6.6; expected
/// rather than observed, because it exists where a variance is zero). All relative to <c>σ²</c>. Pairs of units are not visited: what they
/// contribute factors over lots, so the work grows with the number of units, not with its square.
/// </summary>
/// <param name="point">The likelihood at independent coefficients.</param>
/// <param name="within">Variances within lots over <c>σ²</c>.</param>
/// <param name="between">Variances between lots over <c>σ²</c>.</param>
/// <param name="freedom">Readings less means.</param>
internal sealed class SpreadInformation(NestedPoint point, double[] within, double[] between, int freedom)
{
    private readonly int size = within.Length;
    private readonly (Grid Own, Grid Passed)[] shrinkage = [.. point.Lots.Select(lot => lot.Shrinkage())];

    /// <summary>Information about within (first <c>q</c>), between (next <c>q</c>) and residual variance (last).</summary>
    public Grid Matrix()
    {
        Grid information = new((2 * size) + 1, (2 * size) + 1);
        for (int l = 0; l < point.Lots.Count; l++)
        {
            AddOwn(information, point.Lots[l], Link(l, l));
            for (int m = 0; m < point.Lots.Count; m++)
                AddPair(information, l, m, Link(l, m));
        }

        for (int a = 0; a < 2 * size; a++)
            for (int b = 0; b < a; b++)
                information[b, a] = information[a, b];
        AddResidual(information);
        return information;
    }

    /// <summary><c>F_lm = δ_lm N_l + T_l C T_mᵀ</c>: what the estimation of lot and mean makes two units share.</summary>
    private Grid Link(int l, int m)
    {
        Grid link = shrinkage[l].Passed.Times(point.MeanCovariance).TimesTransposed(shrinkage[m].Passed);
        if (l == m)
            Products.AddTo(link, 1, shrinkage[l].Own);
        return link;
    }

    /// <summary>Each unit with itself: <c>½(P_i − P_iFP_i)²</c> in place of <c>½(P_iFP_i)²</c>, which <see cref="AddPair"/> counts.</summary>
    private void AddOwn(Grid information, LotShare lot, Grid link)
    {
        foreach (UnitShare unit in lot.Units)
        {
            Grid shared = unit.Precision.Times(link).Times(unit.Precision);
            for (int a = 0; a < size; a++)
                for (int b = 0; b < size; b++)
                {
                    double own = unit.Precision[a, b] - shared[a, b];
                    information[a, b] += ((own * own) - (shared[a, b] * shared[a, b])) / 2;
                }
        }
    }

    private void AddPair(Grid information, int l, int m, Grid link)
    {
        LotShare first = point.Lots[l], second = point.Lots[m];
        Grid[] left = OuterProducts(first), right = l == m ? left : OuterProducts(second);
        for (int a = 0; a < size; a++)
        {
            Grid turned = link.Transposed().Times(left[a]).Times(link);
            for (int b = 0; b < size; b++)
                information[a, b] += Products.TraceOfProduct(turned, right[b]) / 2;
        }

        foreach (UnitShare unit in first.Units)
            AddSquares(information, 0, unit.Precision, Weighted(unit.Precision, link, second.Precision, l == m));
        AddSquares(information, size, first.Precision, Weighted(first.Precision, link, second.Precision, l == m));
    }

    /// <summary><c>δP − PFP_m</c>.</summary>
    private static Grid Weighted(Grid precision, Grid link, Grid other, bool same)
    {
        Grid weighted = precision.Times(link).Times(other).ScaledBy(-1);
        if (same)
            Products.AddTo(weighted, 1, precision);
        return weighted;
    }

    /// <summary>Half the squares, into the columns of the variances between lots, or with the roles exchanged.</summary>
    private void AddSquares(Grid information, int row, Grid precision, Grid weighted)
    {
        for (int a = 0; a < precision.Rows; a++)
            for (int b = 0; b < precision.Rows; b++)
            {
                double square = weighted[a, b] * weighted[a, b] / 2;
                if (row == 0)
                    information[size + b, a] += square;
                else
                    information[size + a, size + b] += square;
            }
    }

    /// <summary><c>K[a] = Σ_i p_ia p_iaᵀ</c> with <c>p_ia</c> the column <c>a</c> of <c>P_i</c>.</summary>
    private Grid[] OuterProducts(LotShare lot)
    {
        Grid[] products = [.. Enumerable.Range(0, size).Select(_ => new Grid(size, size))];
        foreach (UnitShare unit in lot.Units)
            for (int a = 0; a < size; a++)
                for (int i = 0; i < size; i++)
                    Products.AddTo(products[a].Row(i), unit.Precision[a, i], unit.Precision.Row(a));
        return products;
    }

    /// <summary>From <c>V = I + Σθ_aV_a</c>: <c>tr(PV_aPV) = tr(PV_a)</c> and <c>tr(PVPV) = n − p</c>.</summary>
    private void AddResidual(Grid information)
    {
        double[] variances = [.. within, .. between];
        double rest = freedom;
        for (int a = 0; a < variances.Length; a++)
        {
            double trace = a < size ? Trace(a) : LotTrace(a - size);
            double with = (trace / 2) - Vectors.Dot(information.Row(a)[..variances.Length], variances);
            information[a, variances.Length] = information[variances.Length, a] = with;
        }

        for (int a = 0; a < variances.Length; a++)
        {
            rest -= 4 * variances[a] * information[a, variances.Length];
            rest -= 2 * variances[a] * Vectors.Dot(information.Row(a)[..variances.Length], variances);
        }

        information[variances.Length, variances.Length] = rest / 2;
    }

    private double Trace(int a)
    {
        double trace = 0;
        for (int l = 0; l < point.Lots.Count; l++)
        {
            Grid link = Link(l, l);
            foreach (UnitShare unit in point.Lots[l].Units)
                trace += unit.Precision[a, a] - Vectors.Dot(unit.Precision.Row(a), link.Times(unit.Precision.Row(a)));
        }

        return trace;
    }

    private double LotTrace(int a)
    {
        double trace = 0;
        for (int l = 0; l < point.Lots.Count; l++)
        {
            Grid precision = point.Lots[l].Precision;
            trace += precision[a, a] - Vectors.Dot(precision.Row(a), Link(l, l).Times(precision.Row(a)));
        }

        return trace;
    }
}
