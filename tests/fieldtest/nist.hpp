#pragma once

#include <cmath>
#include <functional>
#include <span>
#include <string_view>
#include <vector>

// Statistical Reference Datasets of the National Institute of Standards and Technology, nonlinear
// regression: data, models, the two starts, and certified parameters with their standard errors and
// residual sums of squares. From memory; confirmed in that each certified optimum reproduces its
// residual sum and its standard errors from the data to all printed digits with SciPy 1.10.
namespace rainledger::nist {

struct Dataset {
    std::string_view name;
    std::vector<double> x;
    std::vector<double> y;
    std::function<double(std::span<const double>, double)> model;
    std::function<void(std::span<const double>, double, std::span<double>)> slopes;
    std::vector<std::vector<double>> starts;
    std::vector<double> parameters;
    std::vector<double> errors;
    double residual_sum;
};

/// b1 (1 - exp(-b2 x)): a Horton depth with fc = 0.
inline double growth(std::span<const double> b, double x) {
    return -b[0] * std::expm1(-b[1] * x);
}
inline void growth_slopes(std::span<const double> b, double x, std::span<double> out) {
    out[0] = -std::expm1(-b[1] * x);
    out[1] = b[0] * x * std::exp(-b[1] * x);
}

inline Dataset misra1a() {
    return {"Misra1a",
            {77.6, 114.9, 141.1, 190.8, 239.9, 289.0, 332.8, 378.4, 434.8, 477.3, 536.8, 593.1,
             689.1, 760.0},
            {10.07, 14.73, 17.94, 23.93, 29.61, 35.18, 40.02, 44.82, 50.76, 55.05, 61.01, 66.40,
             75.47, 81.78},
            growth,
            growth_slopes,
            {{500.0, 0.0001}, {250.0, 0.0005}},
            {2.3894212918e+02, 5.5015643181e-04},
            {2.7070075241e+00, 7.2668688436e-06},
            1.2455138894e-01};
}

inline Dataset box_bod() {
    return {"BoxBOD",
            {1, 2, 3, 5, 7, 10},
            {109, 149, 149, 191, 213, 224},
            growth,
            growth_slopes,
            {{1.0, 1.0}, {100.0, 0.75}},
            {2.1380940889e+02, 5.4723748542e-01},
            {1.2354515176e+01, 1.0455993237e-01},
            1.1680088766e+03};
}

/// b1/(1 + exp(b2 - b3 x))^(1/b4).
inline Dataset rat43() {
    Dataset set;
    set.name = "Rat43";
    for (int x = 1; x <= 15; ++x)
        set.x.push_back(x);
    set.y = {16.08,  33.83,  65.80,  97.20,  191.55, 326.20, 386.87, 520.53,
             590.03, 651.92, 724.93, 699.56, 689.96, 637.56, 717.41};
    set.model = [](std::span<const double> b, double x) {
        return b[0] / std::pow(1.0 + std::exp(b[1] - b[2] * x), 1.0 / b[3]);
    };
    set.slopes = [](std::span<const double> b, double x, std::span<double> out) {
        const double e = std::exp(b[1] - b[2] * x);
        const double power = std::pow(1.0 + e, -1.0 / b[3]);
        const double by_exponent = -b[0] / b[3] * power / (1.0 + e) * e;
        out[0] = power;
        out[1] = by_exponent;
        out[2] = -x * by_exponent;
        out[3] = b[0] * power * std::log1p(e) / (b[3] * b[3]);
    };
    set.starts = {{100.0, 10.0, 1.0, 1.0}, {700.0, 5.0, 0.75, 1.3}};
    set.parameters = {6.9964151270e+02, 5.2771253025e+00, 7.5962938329e-01, 1.2792483859e+00};
    set.errors = {1.6302297817e+01, 2.0828735829e+00, 1.9566123451e-01, 6.8761936385e-01};
    set.residual_sum = 8.7864049080e+03;
    return set;
}

/// (b1 + b2 x + b3 x^2 + b4 x^3)/(1 + b5 x + b6 x^2 + b7 x^3).
inline Dataset thurber() {
    Dataset set;
    set.name = "Thurber";
    set.x = {-3.067, -2.981, -2.921, -2.912, -2.840, -2.797, -2.702, -2.699, -2.633, -2.481,
             -2.363, -2.322, -1.501, -1.460, -1.274, -1.212, -1.100, -1.046, -0.915, -0.714,
             -0.566, -0.545, -0.400, -0.309, -0.109, -0.103, 0.010,  0.119,  0.377,  0.790,
             0.963,  1.006,  1.115,  1.572,  1.841,  2.047,  2.200};
    set.y = {80.574,   84.248,   87.264,   87.195,   89.076,   89.608,   89.868,   90.101,
             92.405,   95.854,   100.696,  101.060,  401.672,  390.724,  567.534,  635.316,
             733.054,  759.087,  894.206,  990.785,  1090.109, 1080.914, 1122.643, 1178.351,
             1260.531, 1273.514, 1288.339, 1327.543, 1353.863, 1414.509, 1425.208, 1421.384,
             1442.962, 1464.350, 1468.705, 1447.894, 1457.628};
    set.model = [](std::span<const double> b, double x) {
        return (b[0] + x * (b[1] + x * (b[2] + x * b[3]))) /
               (1.0 + x * (b[4] + x * (b[5] + x * b[6])));
    };
    set.slopes = [](std::span<const double> b, double x, std::span<double> out) {
        const double below = 1.0 + x * (b[4] + x * (b[5] + x * b[6]));
        const double value = (b[0] + x * (b[1] + x * (b[2] + x * b[3]))) / below;
        for (std::size_t j = 0; j < 4; ++j)
            out[j] = std::pow(x, static_cast<double>(j)) / below;
        for (std::size_t j = 4; j < 7; ++j)
            out[j] = -value * std::pow(x, static_cast<double>(j - 3)) / below;
    };
    set.starts = {{1000.0, 1000.0, 400.0, 40.0, 0.7, 0.3, 0.03},
                  {1300.0, 1500.0, 500.0, 75.0, 1.0, 0.4, 0.05}};
    set.parameters = {1.2881396800e+03, 1.4910792535e+03, 5.8323836877e+02, 7.5416644291e+01,
                      9.6629502864e-01, 3.9797285797e-01, 4.9727297349e-02};
    set.errors = {4.6647963344e+00, 3.9571156086e+01, 2.8698696102e+01, 5.5675370270e+00,
                  3.1333340687e-02, 1.4984928198e-02, 6.5842344623e-03};
    set.residual_sum = 5.6427082397e+03;
    return set;
}

}  // namespace rainledger::nist
