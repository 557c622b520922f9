using BandSpec.Core.Bands;
using BandSpec.Core.Numerics;
using BandSpec.Core.Requirements;
using MathNet.Numerics.LinearAlgebra;

namespace BandSpec.Core.Planning;

/// <summary>Makes cuts that discard plans below a margin, one form of correction at a time.</summary>
internal sealed class MarginPrices
{
    /// <summary>A part in 10⁹ of the debt is let off, for rounding.</summary>
    private const double Rounding = 1e-9;

    /// <summary>Every fifth pressure is looked at: both terminals and the middle.</summary>
    private const int PressureStep = 5;

    /// <summary>How many of the worst nodes are looked at closely.</summary>
    private const int MostLeaning = 3;

    private readonly SearchTables tables;
    private readonly PriceTables prices;
    private readonly IReadOnlyList<NodeRow> rows;
    private readonly double level;

    public MarginPrices(SearchTables tables, PriceTables prices, IReadOnlyList<NodePlace> added, double level)
    {
        (this.tables, this.prices, this.level) = (tables, prices, level);
        rows = NodeRow.AllOf(tables.Application, added);
    }

    /// <summary>The cut, among those of the nodes that look worst, that a list falls short of by most; nothing when it falls short of none.</summary>
    public PriceCut? Against(int[] list)
    {
        Matrix<double> information = prices.InformationOf(list);
        CapabilityTarget target = tables.Application.Requirement.Capability;
        PriceSystem within = new(prices.Basis, prices.Basis.Within, information), longRun = new(prices.Basis, prices.Basis.LongRun, information);
        List<Bill> bills = [];
        foreach (NodeRow row in rows)
            for (int n = 0; n < row.Pressures.Length; n += PressureStep)
            {
                Keep(bills, FirstBill(within, 3 * target.Sample, row, n, list));
                Keep(bills, FirstBill(longRun, 3 * target.LongRun, row, n, list));
            }

        bills = [.. bills.Select(b => Leaning(b, list)).OfType<Bill>().OrderBy(b => b.Paid / b.Debt).Take(1)];
        if (bills.Count == 0)
            return null;
        PriceCut cut = prices.CutOf(SquareOf(bills[0].Function.Eta), bills[0].Debt);
        return cut.Discards(list, tables.NearestIn(list)) ? cut : null;
    }

    private static void Keep(List<Bill> bills, Bill? bill)
    {
        if (bill is null)
            return;
        bills.Add(bill);
        bills.Sort((a, b) => b.Need.CompareTo(a.Need));
        if (bills.Count > MostLeaning)
            bills.RemoveAt(MostLeaning);
    }

    /// <summary>A node without lean, as a first look at how much of its room a plan with this list needs at least.</summary>
    private Bill? FirstBill(PriceSystem system, double threeC, NodeRow row, int n, int[] list)
    {
        PressureNode node = row.Pressures[n];
        double room = row.Design[n] - node.Added - (Math.Abs(node.Drift) / 2);
        if (room <= 0)
            return null;
        double[] place = prices.Basis.At(node.Shapes.Fraction, tables.Raw.Reduced(row.Temperature));
        PriceFunction function = system.Solve(place, 0);
        return new Bill(system, node, place, level * threeC, room, function, 0, prices.PaidBy(list, function.Eta));
    }

    /// <summary>The same with the lean towards the mean that makes the debt largest, which is found in a few turns.</summary>
    private Bill? Leaning(Bill bill, int[] list)
    {
        Bill now = bill;
        for (int turn = 0; turn < 3; turn++)
        {
            double lean = Math.Sign(now.Function.Mean + (now.Node.Drift / 2)) * now.Sigma / now.Factor;
            now = now with { Function = now.System.Solve(now.Place, lean) };
            now = now with { Paid = prices.PaidBy(list, now.Function.Eta) };
        }

        return BillOf(now, list);
    }

    /// <summary>
    /// What a list owes and pays at a node. With <c>U² = yᵀSy + s² + Σ h²/v</c> every plan has
    /// <c>M + 3Cσ ≥ a + (3C/U)·(h(v) + ϑδ/2 + s²)</c> as long as <c>|ϑ| ≤ U/(3C)</c>, with <c>3C</c> taken times the margin asked for.
    /// </summary>
    private Bill? BillOf(Bill bill, int[] list)
    {
        (PriceFunction function, PressureNode node) = (bill.Function, bill.Node);
        double bracket = Vectors.Dot(function.Eta, bill.Place) + (function.Lean * node.Drift / 2) + node.Variance;
        double square = bill.Factor * bill.Factor, owed = square * bracket * bracket / (bill.Room * bill.Room) * (1 - Rounding);
        double debt = owed - function.Own - node.Variance;
        return bracket > 0 && debt > 0 && owed > square * function.Lean * function.Lean
            ? bill with { Debt = debt, Paid = prices.PaidBy(list, function.Eta) }
            : null;
    }

    private static double[,] SquareOf(double[] eta)
    {
        var square = new double[eta.Length, eta.Length];
        for (int i = 0; i < eta.Length; i++)
            for (int j = 0; j < eta.Length; j++)
                square[i, j] = eta[i] * eta[j];
        return square;
    }

    /// <summary>A node under one criterion with a function: what its cut asks for, and what the list at hand pays.</summary>
    private sealed record Bill(
        PriceSystem System, PressureNode Node, double[] Place, double Factor, double Room, PriceFunction Function, double Debt, double Paid)
    {
        /// <summary>The spread at the node when the list predicts as well as it can.</summary>
        public double Sigma => Math.Sqrt(Function.Own + Node.Variance + Paid);

        /// <summary>The part of the room that mean and spread need then.</summary>
        public double Need => (Math.Abs(Function.Mean + (Node.Drift / 2)) + (Factor * Sigma)) / Room;
    }
}
