using FrameGen.Mechanics.Sections;
using Xunit;

namespace FrameGen.Acceptance.Mechanics;

/// <summary>
/// Printed values of square and rectangular tubes. M kg/m, A cm2, I cm4, W cm3, It cm4, Ct cm3; H stands along the top line.
/// </summary>
public class FlatSidedTableTests
{
    private const double Steel = 7.85e-6;

    // EN 10219-2 sizes as the SCI/BCSA/Tata "Blue Book" P363 prints them for cold-formed tube, to three figures: M, A, Iyy, Izz, Wel,yy,
    // Wel,zz, Wpl,yy, Wpl,zz, It, Ct. The row 20 x 20 x 2 is the formulas of Annex B, rounded the same way.
    [Theory]
    [InlineData(20, 20, 2, "1.05 1.34 0.692 0.692 0.692 0.692 0.877 0.877 1.21 1.06")]
    [InlineData(25, 25, 2, "1.36 1.74 1.48 1.48 1.19 1.19 1.47 1.47 2.53 1.80")]
    [InlineData(30, 30, 2, "1.68 2.14 2.72 2.72 1.81 1.81 2.21 2.21 4.54 2.75")]
    [InlineData(30, 30, 3, "2.36 3.01 3.50 3.50 2.34 2.34 2.96 2.96 6.15 3.58")]
    [InlineData(40, 40, 2, "2.31 2.94 6.94 6.94 3.47 3.47 4.13 4.13 11.3 5.23")]
    [InlineData(40, 40, 3, "3.30 4.21 9.32 9.32 4.66 4.66 5.72 5.72 15.8 7.07")]
    [InlineData(40, 40, 4, "4.20 5.35 11.1 11.1 5.54 5.54 7.01 7.01 19.4 8.48")]
    [InlineData(50, 50, 3, "4.25 5.41 19.5 19.5 7.79 7.79 9.39 9.39 32.1 11.8")]
    [InlineData(50, 50, 5, "6.56 8.36 27.0 27.0 10.8 10.8 13.7 13.7 47.5 16.6")]
    [InlineData(60, 60, 3, "5.19 6.61 35.1 35.1 11.7 11.7 14.0 14.0 57.1 17.7")]
    [InlineData(60, 60, 4, "6.71 8.55 43.6 43.6 14.5 14.5 17.6 17.6 72.6 22.0")]
    [InlineData(80, 80, 4, "9.22 11.7 111 111 27.8 27.8 33.1 33.1 180 41.8")]
    [InlineData(100, 100, 4, "11.7 14.9 226 226 45.3 45.3 53.3 53.3 362 68.1")]
    [InlineData(100, 100, 8, "21.4 27.2 366 366 73.2 73.2 91.1 91.1 645 114")]
    [InlineData(180, 180, 12.5, "60.5 77.0 3.41e3 3.41e3 378 378 467 467 6.05e3 600")]
    [InlineData(50, 25, 2, "2.15 2.74 8.38 2.81 3.35 2.25 4.26 2.62 7.06 3.92")]
    [InlineData(50, 30, 3, "3.30 4.21 12.8 5.70 5.13 3.80 6.57 4.58 13.5 6.49")]
    [InlineData(60, 40, 3, "4.25 5.41 25.4 13.4 8.46 6.72 10.5 7.94 29.3 11.2")]
    [InlineData(60, 40, 4, "5.45 6.95 31.0 16.3 10.3 8.14 13.2 9.89 36.7 13.7")]
    [InlineData(80, 40, 3, "5.19 6.61 52.3 17.6 13.1 8.78 16.5 10.2 43.9 15.3")]
    [InlineData(80, 60, 4, "7.97 10.1 87.9 56.1 22.0 18.7 27.0 22.1 113 30.3")]
    [InlineData(100, 50, 4, "8.59 10.9 134 44.9 26.8 18.0 34.1 20.9 113 31.3")]
    [InlineData(120, 60, 5, "12.8 16.4 287 96.0 47.8 32.0 60.9 37.4 242 55.8")]
    [InlineData(120, 80, 8, "21.4 27.2 476 252 79.3 62.9 102 76.9 584 108")]
    public void Matches_the_printed_table_of_cold_formed_tube(double h, double b, double t, string printed) =>
        ExpectMetric(new FlatSidedTube(h, b, t), printed);

    // EN 10210-2 sizes as P363 prints them for hot-finished tube; the square ones also stand in a public EN 10210-2 table. Outer corner
    // 1.5 T, inner corner 1.0 T.
    [Theory]
    [InlineData(40, 40, 3.2, "3.61 4.60 10.2 10.2 5.11 5.11 6.28 6.28 16.5 7.42")]
    [InlineData(40, 40, 5, "5.28 6.73 13.4 13.4 6.68 6.68 8.66 8.66 22.5 9.60")]
    [InlineData(50, 50, 4, "5.64 7.19 25.0 25.0 9.99 9.99 12.3 12.3 40.4 14.5")]
    [InlineData(60, 60, 5, "8.42 10.7 53.3 53.3 17.8 17.8 21.9 21.9 86.4 25.7")]
    [InlineData(80, 80, 6.3, "14.2 18.1 162 162 40.5 40.5 49.7 49.7 262 58.7")]
    [InlineData(50, 30, 3.2, "3.61 4.60 14.2 6.20 5.68 4.13 7.25 5.00 14.2 6.80")]
    [InlineData(60, 40, 4, "5.64 7.19 32.8 17.0 10.9 8.52 13.8 10.3 36.7 13.7")]
    [InlineData(80, 40, 5, "8.42 10.7 80.3 25.7 20.1 12.9 26.1 15.7 65.1 21.9")]
    [InlineData(100, 50, 5, "10.8 13.7 167 54.3 33.3 21.7 42.6 25.8 135 36.9")]
    public void Matches_the_printed_table_of_hot_finished_tube(double h, double b, double t, string printed) =>
        ExpectMetric(new FlatSidedTube(h, b, t, 1.5 * t, 1.0 * t), printed);

    // A mill's table of EN 10219:2006 rectangular tube, two decimals: M, A, Iyy, Wel,yy, Wpl,yy, Izz, Wel,zz, Wpl,zz, It, Ct.
    [Theory]
    [InlineData(40, 20, 2, "1.68 2.14 4.05 2.02 2.61 1.34 1.34 1.60 3.45 2.36")]
    [InlineData(40, 20, 2.5, "2.03 2.59 4.69 2.35 3.09 1.54 1.54 1.88 4.06 2.72")]
    [InlineData(40, 20, 3, "2.36 3.01 5.21 2.60 3.50 1.68 1.68 2.12 4.57 3.00")]
    [InlineData(40, 30, 2, "1.99 2.54 5.49 2.75 3.37 3.51 2.34 2.77 7.07 3.79")]
    [InlineData(50, 30, 2, "2.31 2.94 9.54 3.81 4.74 4.29 2.86 3.33 9.77 4.84")]
    [InlineData(50, 30, 3, "3.30 4.21 12.83 5.13 6.57 5.70 3.80 4.58 13.53 6.49")]
    [InlineData(60, 40, 2, "2.93 3.74 18.41 6.14 7.47 9.83 4.92 5.65 20.70 8.12")]
    [InlineData(60, 40, 3, "4.25 5.41 25.38 8.46 10.53 13.44 6.72 7.94 29.28 11.17")]
    public void Matches_a_mills_table_of_rectangular_tube(double h, double b, double t, string printed)
    {
        var tube = new FlatSidedTube(h, b, t);
        Printed.Equal(
            printed,
            tube.MassPerMetre(Steel),
            tube.Area / 1e2,
            tube.Iy / 1e4,
            tube.ElasticModulusY / 1e3,
            tube.PlasticModulusY / 1e3,
            tube.Iz / 1e4,
            tube.ElasticModulusZ / 1e3,
            tube.PlasticModulusZ / 1e3,
            tube.J / 1e4,
            tube.TorsionModulus / 1e3);
    }

    private static void ExpectMetric(FlatSidedTube tube, string printed) => Printed.Equal(
        printed,
        tube.MassPerMetre(Steel),
        tube.Area / 1e2,
        tube.Iy / 1e4,
        tube.Iz / 1e4,
        tube.ElasticModulusY / 1e3,
        tube.ElasticModulusZ / 1e3,
        tube.PlasticModulusY / 1e3,
        tube.PlasticModulusZ / 1e3,
        tube.J / 1e4,
        tube.TorsionModulus / 1e3);
}
