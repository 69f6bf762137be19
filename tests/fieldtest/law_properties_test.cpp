#include <algorithm>
#include <array>
#include <cmath>
#include <functional>
#include <limits>
#include <random>

#include "fieldtest/tests_of.hpp"
#include "rainledger/fieldtest/law_fits.hpp"
#include "rainledger/losses/green_ampt.hpp"

// Properties of the fits over tests drawn at random, good ones and hopeless ones.
namespace rainledger {
namespace {

#ifdef RAINLEDGER_FEW_CASES
constexpr int kCases = 40;
#else
constexpr int kCases = 400;
#endif

/// A test of 4 to 15 readings whose rates fall more or less, more or less noisily.
InfiltrationTest random_test(std::mt19937_64& bits) {
    std::uniform_real_distribution<double> uniform(0.0, 1.0);
    const auto count = 4 + static_cast<std::size_t>(12.0 * uniform(bits));
    const ReadingKind kind = uniform(bits) < 0.5 ? ReadingKind::drop : ReadingKind::infiltrated;
    const double first = 20.0 + 200.0 * uniform(bits);
    const double last = first * uniform(bits) * uniform(bits);
    const double decay = std::pow(10.0, 1.5 * uniform(bits) - 0.5);
    const double noise = uniform(bits) * uniform(bits);
    std::vector<double> minutes;
    std::vector<double> values;
    double minute = 0.0;
    double depth = 0.0;
    for (std::size_t i = 0; i < count; ++i) {
        const double step = 2.0 + 13.0 * uniform(bits);
        minute += step;
        const double rate = last + (first - last) * std::exp(-decay * minute / 60.0);
        const double drop = rate * step / 60.0 * (1.0 + noise * (2.0 * uniform(bits) - 1.0));
        depth += drop;
        minutes.push_back(minute);
        values.push_back(kind == ReadingKind::drop ? drop : depth);
    }
    return test_of(kind, minutes, values);
}

double best_sum(const InfiltrationTest& test, const std::vector<std::array<double, 2>>& terms) {
    // Least squares of two terms with weights >= 0: both, or either alone.
    double aa = 0.0, ab = 0.0, bb = 0.0, ad = 0.0, bd = 0.0, dd = 0.0;
    for (std::size_t i = 0; i < terms.size(); ++i) {
        const auto [a, b] = terms[i];
        const TestReading& reading = test.readings[i];
        const double d = errors_add_up(test.kind) ? reading.interval_mm : reading.depth_mm;
        aa += a * a;
        ab += a * b;
        bb += b * b;
        ad += a * d;
        bd += b * d;
        dd += d * d;
    }
    double best = dd;
    if (aa > 0.0) best = std::min(best, dd - std::max(0.0, ad) * ad / aa);
    if (bb > 0.0) best = std::min(best, dd - std::max(0.0, bd) * bd / bb);
    const double determinant = aa * bb - ab * ab;
    const double x = (ad * bb - bd * ab) / determinant;
    const double y = (bd * aa - ad * ab) / determinant;
    if (determinant > 1.0e-9 * aa * bb && x >= 0.0 && y >= 0.0)
        best = std::min(best, dd - x * ad - y * bd);
    return best;
}

using Term = std::function<double(double t)>;

/// The least sum of squares of weights >= 0 on two functions of time.
double sum_of(const InfiltrationTest& test, const Term& a, const Term& b) {
    std::vector<std::array<double, 2>> terms;
    for (const TestReading& reading : test.readings) {
        const double from_h = errors_add_up(test.kind) ? reading.start_h : 0.0;
        const auto growth = [&](const Term& term) {
            return term(reading.end_h) - (from_h > 0.0 ? term(from_h) : 0.0);
        };
        terms.push_back({growth(a), growth(b)});
    }
    return best_sum(test, terms);
}

/// The best of a fine grid of a law's shape, with the other parameters solved for.
double searched_sum(const InfiltrationTest& test, FieldLaw law) {
    constexpr int kGrid = 300;
    double shortest_h = std::numeric_limits<double>::infinity();
    for (const TestReading& reading : test.readings)
        shortest_h = std::min(
            shortest_h, errors_add_up(test.kind) ? reading.end_h - reading.start_h : reading.end_h);
    double best = std::numeric_limits<double>::infinity();
    for (int i = 0; i <= kGrid; ++i) {
        const double share = static_cast<double>(i) / kGrid;
        Term a;
        Term b = [](double t) { return t; };
        if (law == FieldLaw::horton) {
            const double k = std::pow(20.0 / shortest_h / 1.0e-3, share) * 1.0e-3;
            a = [k](double t) { return -std::expm1(-k * t); };
        } else if (law == FieldLaw::green_ampt) {
            const double ratio = std::pow(10.0, 10.0 * share - 6.0);
            a = [ratio](double t) { return green_ampt_cumulative(ratio, 1.0, t); };
            b = [](double /*t*/) { return 0.0; };
        } else if (law == FieldLaw::philip) {
            a = [](double t) { return std::sqrt(t); };
        } else {
            const double exponent = law == FieldLaw::kostiakov ? 2.0 * share : share;
            a = [exponent](double t) { return std::pow(t, exponent); };
            if (law == FieldLaw::kostiakov) b = [](double /*t*/) { return 0.0; };
        }
        best = std::min(best, sum_of(test, a, b));
    }
    return best;
}

bool is_sound(const ParameterEstimate& estimate) {
    if (estimate.kind == EstimateKind::unlimited) return std::isinf(estimate.value);
    const bool has_interval = estimate.low && estimate.high && estimate.standard_error;
    return std::isfinite(estimate.value) && estimate.value >= 0.0 &&
           (!has_interval || (*estimate.low <= estimate.value && estimate.value <= *estimate.high &&
                              std::isfinite(*estimate.standard_error)));
}

}  // namespace

TEST_CASE("no search over a fine grid beats a fit, and every figure is sound") {
    std::mt19937_64 bits(20261202);
    for (int i = 0; i < kCases; ++i) {
        const InfiltrationTest test = random_test(bits);
        for (const FieldLaw law : kFieldLaws) {
            INFO(i << ": " << field_law_key(law));
            const LawFitAnswer answer = fit_law({&test, 1}, law);
            REQUIRE(answer.fit);
            const LawFit& fit = *answer.fit;
            double scale = 0.0;
            for (const FittedReading& reading : fit.readings)
                scale += reading.depth_mm * reading.depth_mm;
            CHECK(fit.residual_sum_mm2 <=
                  searched_sum(test, law) * (1.0 + 1.0e-9) + 1.0e-12 * scale);
            CHECK(std::isfinite(fit.rmse_mm));
            CHECK(fit.r_squared <= 1.0);
            for (const ParameterEstimate& estimate : fit.parameters) {
                INFO(estimate.key << " " << estimate.value);
                CHECK(is_sound(estimate));
            }
            if (law == FieldLaw::horton) CHECK(fit.parameters[0].value >= fit.parameters[1].value);
        }
    }
}

TEST_CASE("a steady term on 0 wants to be negative") {
    std::mt19937_64 bits(20261203);
    int on_bound = 0;
    for (int i = 0; i < kCases; ++i) {
        const InfiltrationTest test = random_test(bits);
        const LawFit fit = *fit_law({&test, 1}, FieldLaw::philip).fit;
        if (fit.parameters[1].kind != EstimateKind::on_bound) continue;
        ++on_bound;
        // The sum of squares rises with A there: residuals pull the steady term down.
        double slope = 0.0;
        for (const FittedReading& reading : fit.readings) {
            const TestReading& read = test.readings[reading.row];
            const bool intervals = errors_add_up(test.kind);
            const double residual = intervals ? read.interval_mm - reading.fitted_rate_mm_per_h *
                                                                       (read.end_h - read.start_h)
                                              : reading.residual_mm;
            slope -= 2.0 * residual * (intervals ? read.end_h - read.start_h : read.end_h);
        }
        CHECK(slope > 0.0);
    }
    CHECK(on_bound > kCases / 20);
}

TEST_CASE("depths and times may be scaled") {
    std::mt19937_64 bits(20261204);
    for (int i = 0; i < kCases / 10; ++i) {
        const InfiltrationTest test = random_test(bits);
        InfiltrationTest scaled = test;
        constexpr double kDepths = 8.0;  // powers of two: exact
        constexpr double kTimes = 4.0;
        for (TestReading& reading : scaled.readings) {
            reading.start_h *= kTimes;
            reading.end_h *= kTimes;
            reading.middle_h *= kTimes;
            reading.interval_mm *= kDepths;
            reading.depth_mm *= kDepths;
            reading.rate_mm_per_h *= kDepths / kTimes;
        }
        const LawFit plain = *fit_law({&test, 1}, FieldLaw::horton).fit;
        const LawFit other = *fit_law({&scaled, 1}, FieldLaw::horton).fit;
        INFO(i);
        CHECK_THAT(other.rmse_mm, WithinRel(kDepths * plain.rmse_mm, 1.0e-6));
        if (plain.condition > 1.0e3 || plain.parameters[1].kind != EstimateKind::fitted) continue;
        CHECK_THAT(other.parameters[0].value,
                   WithinRel(kDepths / kTimes * plain.parameters[0].value, 1.0e-5));
        CHECK_THAT(other.parameters[2].value,
                   WithinRel(plain.parameters[2].value / kTimes, 1.0e-5));
    }
}

TEST_CASE("the same test gives the same bytes") {
    std::mt19937_64 bits(20261205);
    const InfiltrationTest test = random_test(bits);
    for (const FieldLaw law : kFieldLaws) {
        const LawFit first = *fit_law({&test, 1}, law).fit;
        const LawFit second = *fit_law({&test, 1}, law).fit;
        CHECK(first.covariance == second.covariance);
        for (std::size_t i = 0; i < first.parameters.size(); ++i)
            CHECK(first.parameters[i].value == second.parameters[i].value);
    }
}

}  // namespace rainledger
