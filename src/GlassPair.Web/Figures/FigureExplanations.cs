namespace GlassPair.Web.Figures;

/// <summary>How each figure is computed and where that comes from, in one place.</summary>
/// <param name="Name">What it is.</param>
/// <param name="Formula">How it is computed.</param>
/// <param name="Source">Where the formula comes from.</param>
public sealed record FigureExplanation(string Name, string Formula, string Source)
{
    private const string KingslakeJohnson = "R. Kingslake and R. B. Johnson, Lens Design Fundamentals, 2nd ed., chapter 5";

    /// <summary>Color residual.</summary>
    public static FigureExplanation Residual { get; } = new(
        "Color residual", "r² = Σ wᵢ (δfᵢ − mean)², δf = f(λ) − f(λₘ), f(λ) = 1/Σ φⱼ (nⱼ(λ) − 1)/(nⱼ(λₘ) − 1)",
        "weighted least squares over the samples; focal length of thin lenses in contact");

    /// <summary>Data floor.</summary>
    public static FigureExplanation Floor { get; } = new(
        "Data floor", "F² = f² Σ (φⱼ/Φ)² [(σV/V)² Gⱼⱼ + σn²/(nⱼ − 1)²], Gⱼⱼ the variance of (nⱼ(λ) − nⱼ(λₘ))/(nⱼ(λₘ) − 1) over the band",
        "first-order propagation of independent errors of index and Abbe number; grades of ISO 12123");

    /// <summary>Expected residual.</summary>
    public static FigureExplanation Expected { get; } = new("Expected residual", "√(r² + F²)", "root-sum-square of residual and data floor");

    /// <summary>Peak-to-valley focal shift.</summary>
    public static FigureExplanation Range { get; } = new("Peak to valley", "largest less smallest δf over the samples", "definition");

    /// <summary>Secondary spectrum.</summary>
    public static FigureExplanation Secondary { get; } = new(
        "Secondary spectrum", "f(λₘ) − ½ [f(λₛ) + f(λₗ)]; for ends united −f (P₁ − P₂)/(V₁ − V₂), ordinary pairs about f/2000", KingslakeJohnson);

    /// <summary>Primary axial color.</summary>
    public static FigureExplanation AxialColor { get; } = new("Primary axial color", "f(λₛ) − f(λₗ); nil where the ends are united", KingslakeJohnson);

    /// <summary>Color-limited f-number.</summary>
    public static FigureExplanation HoldsTo { get; } = new(
        "Holds to", "N = √(½ (peak to valley)/(2 λₘ)): half the range inside the quarter wave ±2 λ N²",
        "Rayleigh's quarter wave; W. J. Smith, Modern Optical Engineering");

    /// <summary>Waves of defocus.</summary>
    public static FigureExplanation Waves { get; } = new(
        "In waves", "W = r/(8 N² λₘ), defocus at the edge of the pupil", "Rayleigh's quarter wave; W. J. Smith, Modern Optical Engineering");

    /// <summary>Petzval radius.</summary>
    public static FigureExplanation Petzval { get; } = new(
        "Petzval radius", "−1/Σ (φⱼ/nⱼ); negative: the image curves towards the lens", "J. Petzval; W. J. Smith, Modern Optical Engineering");

    /// <summary>Power of an element.</summary>
    public static FigureExplanation Power { get; } = new(
        "Powers", "ends united: φ₁/Φ = V₁/(V₁ − V₂), φ₂/Φ = −V₂/(V₁ − V₂); band balanced: least variance of Φ(λ)/Φ over the samples", KingslakeJohnson);

    /// <summary>Focal lengths of the elements.</summary>
    public static FigureExplanation FocalLengths { get; } = new("Focal lengths", "fⱼ = f/(φⱼ/Φ)", "definition of power");

    /// <summary>Abbe number of the band.</summary>
    public static FigureExplanation Abbe { get; } = new(
        "Abbe numbers", "V = (n(λₘ) − 1)/(n(λₛ) − n(λₗ))", "P. Hartmann, Optical Glass (SPIE Press, 2014), chapter 3, for any three wavelengths");

    /// <summary>Partial dispersion of the band.</summary>
    public static FigureExplanation Partial { get; } = new(
        "Partial dispersions", "P = (n(λₛ) − n(λₘ))/(n(λₛ) − n(λₗ))", "P. Hartmann, Optical Glass (SPIE Press, 2014), chapter 3, for any three wavelengths");

    /// <summary>Index at the design wavelength.</summary>
    public static FigureExplanation Index { get; } = new(
        "Indices", "n(λₘ) from the maker's dispersion formula, against air at the glass's reference temperature and 101 325 Pa", "the stock's coefficients");
}
