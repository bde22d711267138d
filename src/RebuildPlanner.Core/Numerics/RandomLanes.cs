using System.Runtime.Intrinsics;
using static System.Runtime.CompilerServices.MethodImplOptions;
using Inline = System.Runtime.CompilerServices.MethodImplAttribute;

namespace RebuildPlanner.Core.Numerics;

/// <summary>Eight streams of random bits side by side.</summary>
/// <remarks>xoshiro256**, each stream begun by SplitMix64. Source: blackmanvigna2021. Valid for: simulation, not secrets. Error: period 2²⁵⁶ − 1.</remarks>
public struct RandomLanes
{
    // The step of SplitMix64: 2⁶⁴ over the golden ratio, made odd.
    private const ulong Golden = 0x9E3779B97F4A7C15;
    private const double Step = 1.0 / (1UL << 53);

    private Vector512<ulong> _a, _b, _c, _d;

    /// <summary>Begins the streams of one block of trials.</summary>
    /// <param name="seed">The seed of the whole run.</param>
    /// <param name="block">The block's number: each has streams of its own, so it matters to no answer who computes it.</param>
    public RandomLanes(ulong seed, ulong block)
    {
        ulong state = Mixed(seed + Golden) ^ Mixed((block + 1) * Golden);
        Span<ulong> words = stackalloc ulong[4 * Vector512<ulong>.Count];
        foreach (ref ulong word in words)
        {
            state += Golden;
            word = Mixed(state);
        }

        int lanes = Vector512<ulong>.Count;
        (_a, _b) = (Vector512.Create<ulong>(words), Vector512.Create<ulong>(words[lanes..]));
        (_c, _d) = (Vector512.Create<ulong>(words[(2 * lanes)..]), Vector512.Create<ulong>(words[(3 * lanes)..]));
    }

    private RandomLanes(Vector512<ulong> a, Vector512<ulong> b, Vector512<ulong> c, Vector512<ulong> d) => (_a, _b, _c, _d) = (a, b, c, d);

    /// <summary>Streams that all begin with one state, to be compared with the generator's definition.</summary>
    internal static RandomLanes FromState(ulong a, ulong b, ulong c, ulong d) =>
        new(Vector512.Create(a), Vector512.Create(b), Vector512.Create(c), Vector512.Create(d));

    /// <summary>The next 64 bits of each stream.</summary>
    [Inline(AggressiveInlining)]
    public Vector512<ulong> NextBits()
    {
        Vector512<ulong> five = _b + (_b << 2), seven = (five << 7) | (five >> 57), bits = seven + (seven << 3), shifted = _b << 17;
        _c ^= _a;
        _d ^= _b;
        _b ^= _c;
        _a ^= _d;
        _c ^= shifted;
        _d = (_d << 45) | (_d >> 19);
        return bits;
    }

    /// <summary>The next number of each stream, from 0 up to but not with 1.</summary>
    [Inline(AggressiveInlining)]
    public Vector512<double> NextUniform()
    {
        // The bits of a number from 1 to 2, less one: no conversion of whole numbers, which not every machine has in wide registers.
        return ((NextBits() >> 12) | Vector512.Create(0x3FF0_0000_0000_0000UL)).AsDouble() - Vector512<double>.One;
    }

    /// <summary>A number above 0 and up to 1, from the first stream; the others step with it.</summary>
    public double NextAboveZero() => ((NextBits()[0] >> 11) + 1) * Step;

    private static ulong Mixed(ulong bits)
    {
        bits = (bits ^ (bits >> 30)) * 0xBF58476D1CE4E5B9;
        bits = (bits ^ (bits >> 27)) * 0x94D049BB133111EB;
        return bits ^ (bits >> 31);
    }
}
