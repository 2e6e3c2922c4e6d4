namespace Redshift.Physics.Profiles;

/// <summary>
/// The error function and its complement to the last digits, without the allocations of the general library: a line
/// fit calls them once a pixel.
/// Reference: W. J. Cody, Math. Comp. 23, 631 (1969), tables II and III.
/// </summary>
internal static class ErrorFunction
{
    private const double Small = 0.46875;

    // Beyond, erf is 1 in double precision.
    private const double Saturated = 6;

    public static double Erf(double x)
    {
        double size = Math.Abs(x);
        if (size <= Small)
            return NearZero(x);
        return Math.CopySign(size >= Saturated ? 1 : 1 - Tail(size), x);
    }

    public static double Erfc(double x)
    {
        if (Math.Abs(x) <= Small)
            return 1 - NearZero(x);
        return x < 0 ? 2 - Tail(-x) : Tail(x);
    }

    private static double Tail(double x) => Math.Exp(-x * x) * (x <= 4 ? Middle(x) : Far(x));

    private static double NearZero(double x)
    {
        double y = x * x;
        double p = 3.20937758913846947e3
            + y * (3.77485237685302021e2 + y * (1.13864154151050156e2 + y * (3.16112374387056560 + y * 1.85777706184603153e-1)));
        double q = 2.84423683343917062e3
            + y * (1.28261652607737228e3 + y * (2.44024637934444173e2 + y * (2.36012909523441209e1 + y)));
        return x * p / q;
    }

    private static double Middle(double x)
    {
        double p = 1.23033935479799725e3 + x * (2.05107837782607147e3 + x * (1.71204761263407058e3 + x * (8.81952221241769090e2
            + x * (2.98635138197400131e2 + x * (6.61191906371416295e1 + x * (8.88314979438837594 + x * (5.64188496988670089e-1
            + x * 2.15311535474403846e-8)))))));
        double q = 1.23033935480374942e3 + x * (3.43936767414372164e3 + x * (4.36261909014324716e3 + x * (3.29079923573345963e3
            + x * (1.62138957456669019e3 + x * (5.37181101862009858e2 + x * (1.17693950891312499e2 + x * (1.57449261107098347e1
            + x)))))));
        return p / q;
    }

    private static double Far(double x)
    {
        double y = 1 / (x * x);
        double p = 6.58749161529837803e-4 + y * (1.60837851487422766e-2 + y * (1.25781726111229246e-1 + y * (3.60344899949804439e-1
            + y * (3.05326634961232344e-1 + y * 1.63153871373020978e-2))));
        double q = 2.33520497626869185e-3 + y * (6.05183413124413191e-2 + y * (5.27905102951428412e-1 + y * (1.87295284992346725
            + y * (2.56852019228982242 + y))));
        return (1 / Math.Sqrt(Math.PI) - y * p / q) / x;
    }
}
