using System.Runtime.Intrinsics;
using static System.Runtime.CompilerServices.MethodImplOptions;
using Inline = System.Runtime.CompilerServices.MethodImplAttribute;

namespace RebuildPlanner.Core.Numerics;

/// <summary>Standard normal numbers, many at a time.</summary>
/// <remarks>
/// Box–Muller in single precision: √(−2 ln u)·cos 2πv and sin 2πv. Its own logarithm, sine and cosine use + − × ÷ √ alone, so that every machine
/// draws the same numbers to the bit. Source: boxmuller1958. Valid for: measuring doubts. Error: none beyond |z| = 5.77, steps of some 1e-7.
/// </remarks>
public static class NormalDraws
{
    /// <summary>How many numbers are drawn at once: a span to fill is a multiple of it.</summary>
    public const int Batch = 32;

    // 24 bits of u and of the quarter turn: what a single holds.
    private const float PerBit = 1.0f / (1 << 24);

    /// <summary>Fills with standard normal numbers.</summary>
    /// <param name="normals">Where they go; a multiple of <see cref="Batch"/>.</param>
    /// <param name="random">Where the bits come from.</param>
    public static void Fill(Span<double> normals, ref RandomLanes random)
    {
        for (int at = 0; at < normals.Length; at += Batch)
        {
            Vector512<uint> radial = random.NextBits().AsUInt32(), turning = random.NextBits().AsUInt32();
            Vector512<float> u = Vector512.ConvertToSingle((radial >> 8).AsInt32() + Vector512<int>.One) * PerBit;
            Vector512<float> radius = Vector512.Sqrt(-2.0f * Log(u));
            SineCosine(turning, out Vector512<float> sine, out Vector512<float> cosine);
            Store(radius * cosine, normals[at..]);
            Store(radius * sine, normals[(at + Vector512<float>.Count)..]);
        }
    }

    [Inline(AggressiveInlining)]
    private static void Store(Vector512<float> values, Span<double> to)
    {
        (Vector512<double> low, Vector512<double> high) = Vector512.Widen(values);
        low.CopyTo(to);
        high.CopyTo(to[Vector512<double>.Count..]);
    }

    // ln(m·2^e) = e·ln 2 + ln m with m from √½ to √2; f − f²/2 + f³·P(f), P fitted to least greatest error (1.3e-9) by Lawson's weights.
    [Inline(AggressiveInlining)]
    private static Vector512<float> Log(Vector512<float> u)
    {
        Vector512<int> bits = u.AsInt32() - Vector512.Create(0x3F3504F3); // √½
        Vector512<float> exponent = Vector512.ConvertToSingle(bits >> 23);
        Vector512<float> f = ((bits & Vector512.Create(0x007FFFFF)) + Vector512.Create(0x3F3504F3)).AsSingle() - Vector512<float>.One;
        Vector512<float> p = Vector512.Create(-0.07631149142980576f);
        p = (p * f) + Vector512.Create(0.1285490095615387f);
        p = (p * f) + Vector512.Create(-0.13207900524139404f);
        p = (p * f) + Vector512.Create(0.14190010726451874f);
        p = (p * f) + Vector512.Create(-0.16616521775722504f);
        p = (p * f) + Vector512.Create(0.20001615583896637f);
        p = (p * f) + Vector512.Create(-0.25001060962677f);
        p = (p * f) + Vector512.Create(0.333333283662796f);
        Vector512<float> square = f * f;
        return (exponent * Vector512.Create(0.6931471805599453f)) + (f + ((square * f * p) - (0.5f * square)));
    }

    // The two highest bits are the quarter, the next 24 the turn within it, from −1/8 to 1/8 of a whole; polynomials fitted as above (2e-9, 1e-10).
    [Inline(AggressiveInlining)]
    private static void SineCosine(Vector512<uint> bits, out Vector512<float> sine, out Vector512<float> cosine)
    {
        Vector512<int> within = ((bits >> 6) & Vector512.Create(0x00FFFFFFu)).AsInt32();
        Vector512<float> x = ((Vector512.ConvertToSingle(within) * PerBit) - Vector512.Create(0.5f)) * Vector512.Create(1.5707963267948966f);
        Vector512<float> z = x * x;
        Vector512<float> s = (((Vector512.Create(-0.00019495634478516877f) * z) + Vector512.Create(0.00833197869360447f)) * z) + Vector512.Create(-0.16666650772094727f);
        Vector512<float> c = (((Vector512.Create(2.443845005473122e-05f) * z) + Vector512.Create(-0.001388736767694354f)) * z) + Vector512.Create(0.04166664555668831f);
        Vector512<float> ofSine = x + (x * z * s), ofCosine = Vector512<float>.One + ((z * z * c) - (0.5f * z));

        // A quarter turn swaps the two, a half turn changes both signs.
        Vector512<uint> odd = Vector512<uint>.Zero - ((bits >> 30) & Vector512<uint>.One), half = (bits >> 31) << 31;
        sine = Vector512.ConditionalSelect(odd.AsSingle(), ofCosine, ofSine) ^ half.AsSingle();
        cosine = Vector512.ConditionalSelect(odd.AsSingle(), -ofSine, ofCosine) ^ half.AsSingle();
    }
}
