#include "fieldtest/law_model.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

#include "rainledger/losses/green_ampt.hpp"
#include "rainledger/losses/horton.hpp"
#include "rainledger/losses/philip.hpp"

namespace rainledger {
namespace {

constexpr double kInfinite = std::numeric_limits<double>::infinity();
/// Below this the closed forms of the slopes cancel and their series are used; at it, thirteen
/// terms reach the last bit.
constexpr double kSmall = 0.1;
constexpr int kTerms = 16;

using Own = std::span<const double>;

// --- Horton: d, fc, k. ---

HortonCurve horton_curve(Own own) {
    return {own[0] + own[1], own[1], own[2]};
}

/// (exp(-x) (1 + x) - 1)/x^2, the derivative of (1 - exp(-x))/x.
double decay_slope(double x) {
    if (x >= kSmall) return (std::exp(-x) * (1.0 + x) - 1.0) / (x * x);
    double power = 1.0;  // (-x)^(n - 2)/n!
    double sum = 0.0;
    for (int n = 2; n < kTerms; ++n) {
        power = n == 2 ? 0.5 : -power * x / n;
        sum -= (n - 1) * power;
    }
    return sum;
}

LawSlopes horton_slopes(Own own, double t) {
    const double x = own[2] * t;
    const double mean = x > 0.0 ? -std::expm1(-x) / x : 1.0;
    return {t * mean, t, own[0] * t * t * decay_slope(x)};
}

// --- Green and Ampt: K, B. ---

double suction_deficit(Own own) {
    return own[1] / (2.0 * own[0]);
}

double own_green_ampt_depth(Own own, double t) {
    if (own[0] == 0.0) return std::sqrt(own[1] * t);
    return green_ampt_cumulative(own[0], suction_deficit(own), t);
}

/// ln(1 + x) - x/(1 + x).
double log_less_share(double x) {
    if (x >= kSmall) return std::log1p(x) - x / (1.0 + x);
    double power = x;
    double sum = 0.0;
    for (int n = 2; n < kTerms; ++n) {
        power *= -x;
        sum -= power * (1.0 - 1.0 / n);
    }
    return sum;
}

/// x + x/(1 + x) - 2 ln(1 + x).
double excess_of_share(double x) {
    if (x >= kSmall) return x + x / (1.0 + x) - 2.0 * std::log1p(x);
    double power = -x * x;
    double sum = 0.0;
    for (int n = 3; n < kTerms + 2; ++n) {
        power *= -x;
        sum += power * (1.0 - 2.0 / n);
    }
    return sum;
}

// With x = F/S: dF/dK at fixed S is t (1 + x)/x, dF/dS at fixed K is (1 + x)/x (ln(1 + x) -
// x/(1 + x)), and S = B/(2 K). At K = 0 the limits are 2 t/3 and sqrt(t/B)/2.
LawSlopes green_ampt_slopes(Own own, double t) {
    constexpr double kSmallestShare = 1.0e-8;
    const auto [K, B] = std::array{own[0], own[1]};
    if (B == 0.0) return {t, K > 0.0 ? 0.0 : kInfinite, 0.0};
    const double S = K > 0.0 ? suction_deficit(own) : kInfinite;
    const double x = own_green_ampt_depth(own, t) / S;
    if (!(x > kSmallestShare)) return {2.0 * t / 3.0, 0.5 * std::sqrt(t / B), 0.0};
    const double factor = (1.0 + x) / x;
    return {S / K * factor * excess_of_share(x), factor * log_less_share(x) / (2.0 * K), 0.0};
}

double green_ampt_rate(Own own, double t) {
    if (own[1] == 0.0) return own[0];
    if (t == 0.0) return kInfinite;
    if (own[0] == 0.0) return 0.5 * std::sqrt(own[1] / t);
    return green_ampt_capacity(own[0], suction_deficit(own), own_green_ampt_depth(own, t));
}

// --- Kostiakov: a, b, and c in the modified form. ---

double power_rate(double a, double b, double t) {
    if (a == 0.0 || b == 0.0) return 0.0;
    return a * b * std::pow(t, b - 1.0);
}

}  // namespace

std::size_t law_parameter_count(FieldLaw law) {
    return law == FieldLaw::horton || law == FieldLaw::modified_kostiakov ? 3 : 2;
}

double law_depth(FieldLaw law, Own own, double t) {
    switch (law) {
        case FieldLaw::horton:
            return horton_cumulative(horton_curve(own), t);
        case FieldLaw::green_ampt:
            return own_green_ampt_depth(own, t);
        case FieldLaw::philip:
            return philip_cumulative(own[0], own[1], t);
        case FieldLaw::kostiakov:
            return own[0] * std::pow(t, own[1]);
        case FieldLaw::modified_kostiakov:
            break;
    }
    return own[0] * std::pow(t, own[1]) + own[2] * t;
}

double law_rate(FieldLaw law, Own own, double t) {
    switch (law) {
        case FieldLaw::horton:
            return horton_capacity(horton_curve(own), t);
        case FieldLaw::green_ampt:
            return green_ampt_rate(own, t);
        case FieldLaw::philip:
            return philip_capacity(own[0], own[1], t);
        case FieldLaw::kostiakov:
            return power_rate(own[0], own[1], t);
        case FieldLaw::modified_kostiakov:
            break;
    }
    return power_rate(own[0], own[1], t) + own[2];
}

LawSlopes law_slopes(FieldLaw law, Own own, double t) {
    switch (law) {
        case FieldLaw::horton:
            return horton_slopes(own, t);
        case FieldLaw::green_ampt:
            return green_ampt_slopes(own, t);
        case FieldLaw::philip:
            return {std::sqrt(t), t, 0.0};
        case FieldLaw::kostiakov:
        case FieldLaw::modified_kostiakov:
            break;
    }
    const double power = std::pow(t, own[1]);
    return {power, own[0] * power * std::log(t), t};
}

double law_growth(FieldLaw law, Own own, double from_h, double to_h) {
    const double before = from_h > 0.0 ? law_depth(law, own, from_h) : 0.0;
    return law_depth(law, own, to_h) - before;
}

namespace {

EstimateKind kind_of(Standing standing) {
    return standing == Standing::inside ? EstimateKind::fitted : EstimateKind::on_bound;
}

std::vector<ReportedParameter> reported_horton(Own own, std::span<const Standing> standing) {
    return {{"initial_capacity_mm_per_h", own[0] + own[1], kind_of(standing[0]), {1.0, 1.0, 0.0}},
            {"final_capacity_mm_per_h", own[1], kind_of(standing[1]), {0.0, 1.0, 0.0}},
            {"decay_per_h", own[2], kind_of(standing[2]), {0.0, 0.0, 1.0}, false}};
}

std::vector<ReportedParameter> reported_green_ampt(Own own, std::span<const Standing> standing) {
    const auto [K, B] = std::array{own[0], own[1]};
    ReportedParameter suction{"suction_deficit_mm", 0.0, kind_of(standing[1]), {}};
    if (K == 0.0 && B > 0.0) {
        suction.value = kInfinite;
        suction.kind = EstimateKind::unlimited;
    } else if (K > 0.0) {
        suction.value = suction_deficit(own);
        suction.by_own = {-suction.value / K, 0.5 / K, 0.0};
    }
    return {{"effective_conductivity_mm_per_h", K, kind_of(standing[0]), {1.0, 0.0, 0.0}}, suction};
}

std::vector<ReportedParameter> reported_as_they_are(FieldLaw law, Own own,
                                                    std::span<const Standing> standing) {
    if (law == FieldLaw::philip)
        return {{"sorptivity_mm_per_sqrt_h", own[0], kind_of(standing[0]), {1.0, 0.0, 0.0}},
                {"steady_term_mm_per_h", own[1], kind_of(standing[1]), {0.0, 1.0, 0.0}}};
    std::vector<ReportedParameter> reported{
        {"coefficient_mm", own[0], kind_of(standing[0]), {1.0, 0.0, 0.0}},
        {"exponent", own[1], kind_of(standing[1]), {0.0, 1.0, 0.0}, false}};
    if (law == FieldLaw::modified_kostiakov)
        reported.push_back({"steady_term_mm_per_h", own[2], kind_of(standing[2]), {0.0, 0.0, 1.0}});
    return reported;
}

}  // namespace

std::vector<ReportedParameter> reported_parameters(FieldLaw law, Own own,
                                                   std::span<const Standing> standing) {
    if (law == FieldLaw::horton) return reported_horton(own, standing);
    if (law == FieldLaw::green_ampt) return reported_green_ampt(own, standing);
    return reported_as_they_are(law, own, standing);
}

}  // namespace rainledger
