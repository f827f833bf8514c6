using System.Diagnostics;
using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace GlassPair.Optics.Rankings;

/// <summary>Several doubles that are computed with at once, so that a kernel is written once for every width. Comparisons give masks: all bits set where true.</summary>
/// <remarks>Each operation rounds as the same operation on one double does; none is fused with another.</remarks>
internal interface ILanes<T>
    where T : unmanaged, ILanes<T>
{
    static abstract int Count { get; }

    static abstract T All(double value);

    /// <summary>Reads from a column, which reaches a vector's width past its last value of use: only the start is checked.</summary>
    static abstract T Load(double[] column, int start);

    static abstract T operator +(T left, T right);

    static abstract T operator -(T left, T right);

    static abstract T operator -(T value);

    static abstract T operator *(T left, T right);

    static abstract T operator *(double left, T right);

    static abstract T operator /(T left, T right);

    static abstract T Abs(T value);

    static abstract T SquareRoot(T value);

    static abstract T CopySign(T value, T sign);

    static abstract T Min(T left, T right);

    static abstract T Max(T left, T right);

    static abstract T operator &(T left, T right);

    static abstract T AreEqual(T left, T right);

    static abstract T AtMost(T left, T right);

    static abstract T Exceeds(T left, T right);

    static abstract T Select(T mask, T where, T elsewhere);

    /// <summary>Gets a mask as bits, the first lane lowest.</summary>
    static abstract uint Bits(T mask);

    /// <summary>Writes to a column, which reaches as far as for <see cref="Load"/>.</summary>
    void Store(double[] column, int start);
}

/// <summary>Eight lanes.</summary>
internal readonly struct Lanes512(Vector512<double> value) : ILanes<Lanes512>
{
    private readonly Vector512<double> _value = value;

    public static int Count => 8;

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 All(double value) => new(Vector512.Create(value));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 Load(double[] column, int start)
    {
        Debug.Assert(start + Count <= column.Length, "The column is not padded.");
        return new(Vector512.LoadUnsafe(ref column[start]));
    }

    public static Lanes512 operator +(Lanes512 left, Lanes512 right) => new(left._value + right._value);

    public static Lanes512 operator -(Lanes512 left, Lanes512 right) => new(left._value - right._value);

    public static Lanes512 operator -(Lanes512 value) => new(-value._value);

    public static Lanes512 operator *(Lanes512 left, Lanes512 right) => new(left._value * right._value);

    public static Lanes512 operator *(double left, Lanes512 right) => new(left * right._value);

    public static Lanes512 operator /(Lanes512 left, Lanes512 right) => new(left._value / right._value);

    public static Lanes512 operator &(Lanes512 left, Lanes512 right) => new(left._value & right._value);

    public static Lanes512 Abs(Lanes512 value) => new(Vector512.Abs(value._value));

    public static Lanes512 SquareRoot(Lanes512 value) => new(Vector512.Sqrt(value._value));

    public static Lanes512 CopySign(Lanes512 value, Lanes512 sign) => new(Vector512.CopySign(value._value, sign._value));

    public static Lanes512 Min(Lanes512 left, Lanes512 right) => new(Vector512.MinNative(left._value, right._value));

    public static Lanes512 Max(Lanes512 left, Lanes512 right) => new(Vector512.MaxNative(left._value, right._value));

    public static Lanes512 AreEqual(Lanes512 left, Lanes512 right) => new(Vector512.Equals(left._value, right._value));

    public static Lanes512 AtMost(Lanes512 left, Lanes512 right) => new(Vector512.LessThanOrEqual(left._value, right._value));

    public static Lanes512 Exceeds(Lanes512 left, Lanes512 right) => new(Vector512.GreaterThan(left._value, right._value));

    public static Lanes512 Select(Lanes512 mask, Lanes512 where, Lanes512 elsewhere) =>
        new(Vector512.ConditionalSelect(mask._value, where._value, elsewhere._value));

    public static uint Bits(Lanes512 mask) => (uint)mask._value.ExtractMostSignificantBits();

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public void Store(double[] column, int start)
    {
        Debug.Assert(start + Count <= column.Length, "The column is not padded.");
        _value.StoreUnsafe(ref column[start]);
    }
}

/// <summary>Four lanes.</summary>
internal readonly struct Lanes256(Vector256<double> value) : ILanes<Lanes256>
{
    private readonly Vector256<double> _value = value;

    public static int Count => 4;

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 All(double value) => new(Vector256.Create(value));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 Load(double[] column, int start)
    {
        Debug.Assert(start + Count <= column.Length, "The column is not padded.");
        return new(Vector256.LoadUnsafe(ref column[start]));
    }

    public static Lanes256 operator +(Lanes256 left, Lanes256 right) => new(left._value + right._value);

    public static Lanes256 operator -(Lanes256 left, Lanes256 right) => new(left._value - right._value);

    public static Lanes256 operator -(Lanes256 value) => new(-value._value);

    public static Lanes256 operator *(Lanes256 left, Lanes256 right) => new(left._value * right._value);

    public static Lanes256 operator *(double left, Lanes256 right) => new(left * right._value);

    public static Lanes256 operator /(Lanes256 left, Lanes256 right) => new(left._value / right._value);

    public static Lanes256 operator &(Lanes256 left, Lanes256 right) => new(left._value & right._value);

    public static Lanes256 Abs(Lanes256 value) => new(Vector256.Abs(value._value));

    public static Lanes256 SquareRoot(Lanes256 value) => new(Vector256.Sqrt(value._value));

    public static Lanes256 CopySign(Lanes256 value, Lanes256 sign) => new(Vector256.CopySign(value._value, sign._value));

    public static Lanes256 Min(Lanes256 left, Lanes256 right) => new(Vector256.MinNative(left._value, right._value));

    public static Lanes256 Max(Lanes256 left, Lanes256 right) => new(Vector256.MaxNative(left._value, right._value));

    public static Lanes256 AreEqual(Lanes256 left, Lanes256 right) => new(Vector256.Equals(left._value, right._value));

    public static Lanes256 AtMost(Lanes256 left, Lanes256 right) => new(Vector256.LessThanOrEqual(left._value, right._value));

    public static Lanes256 Exceeds(Lanes256 left, Lanes256 right) => new(Vector256.GreaterThan(left._value, right._value));

    public static Lanes256 Select(Lanes256 mask, Lanes256 where, Lanes256 elsewhere) =>
        new(Vector256.ConditionalSelect(mask._value, where._value, elsewhere._value));

    public static uint Bits(Lanes256 mask) => mask._value.ExtractMostSignificantBits();

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public void Store(double[] column, int start)
    {
        Debug.Assert(start + Count <= column.Length, "The column is not padded.");
        _value.StoreUnsafe(ref column[start]);
    }
}
