#include "fieldtest/law_warnings.hpp"

#include <algorithm>
#include <array>
#include <string>
#include <string_view>
#include <utility>

#include "rainledger/base/number.hpp"

namespace rainledger {
namespace {

constexpr double kDecade = 10.0;
constexpr double kTooCorrelated = 0.5;
constexpr std::size_t kLastRates = 3;
constexpr double kClearlyAbove = 1.05;  // of a rate; nearer is within the reading

bool is_steady_term(std::string_view key) {
    return key == "final_capacity_mm_per_h" || key == "effective_conductivity_mm_per_h" ||
           key == "steady_term_mm_per_h";
}

class Warner {
public:
    Warner(const LawFit& fit, std::span<const InfiltrationTest> tests) : fit_(fit), tests_(tests) {}

    std::vector<FitWarning> warnings() {
        check_bounds();
        check_intervals();
        check_readings();
        if (fit_.law == FieldLaw::horton) check_horton();
        check_rise();
        return std::move(warnings_);
    }

private:
    void check_bounds();
    void check_bound(const ParameterEstimate& estimate);
    void check_intervals();
    void check_readings();
    void check_horton();
    void check_rise();
    [[nodiscard]] double longest_h() const;
    void warn(FitCaution caution, const std::string& text) {
        warnings_.push_back({caution, std::string(field_law_name(fit_.law)) + ": " + text});
    }

    const LawFit& fit_;
    std::span<const InfiltrationTest> tests_;
    std::vector<FitWarning> warnings_;
};

double Warner::longest_h() const {
    double longest = 0.0;
    for (const InfiltrationTest& test : tests_)
        longest = std::max(longest, test.readings.back().end_h);
    return longest;
}

void Warner::check_bound(const ParameterEstimate& estimate) {
    const std::string name(words_of_parameter(estimate.key));
    if (is_steady_term(estimate.key))
        warn(FitCaution::negative_steady_term,
             "the " + name +
                 " ended on its bound, 0; the free fit would be negative, so these readings do not "
                 "tell a steady rate");
    else if (estimate.key == "initial_capacity_mm_per_h")
        warn(FitCaution::on_bound,
             "the initial capacity ended on the final one: the rates do not fall");
    else if (estimate.key == "decay_per_h" && estimate.value > 0.0)
        warn(FitCaution::on_bound, "the decay ended on its bound of " +
                                       three_figures(estimate.value) +
                                       " 1/h: the rate has fallen before the first reading, and "
                                       "the initial capacity tells "
                                       "no more than a depth taken in at once");
    else
        warn(FitCaution::on_bound,
             "the " + name + " ended on its bound, " + three_figures(estimate.value));
}

/// Once the part of the rate that falls is gone, so is the meaning of how it falls.
bool says_nothing_more(const ParameterEstimate& estimate, const LawFit& fit) {
    const bool is_shape = estimate.key == "decay_per_h" || estimate.key == "exponent";
    return is_shape && fit.parameters[0].kind == EstimateKind::on_bound;
}

void Warner::check_bounds() {
    for (const ParameterEstimate& estimate : fit_.parameters)
        if (estimate.kind == EstimateKind::on_bound && !says_nothing_more(estimate, fit_))
            check_bound(estimate);
}

void Warner::check_intervals() {
    if (fit_.degrees_of_freedom == 0) return;
    for (const ParameterEstimate& estimate : fit_.parameters) {
        if (estimate.kind != EstimateKind::fitted) continue;
        const std::string name(words_of_parameter(estimate.key));
        if (!estimate.low)
            warn(FitCaution::not_identified, "the readings do not tell the " + name);
        else if (*estimate.low <= 0.0)
            warn(FitCaution::not_identified,
                 "the interval of the " + name + " spans zero: the readings do not tell it");
        else if (*estimate.high > kDecade * *estimate.low)
            warn(FitCaution::not_identified, "the interval of the " + name +
                                                 " spans more than a factor of ten: the readings "
                                                 "hardly tell it");
    }
}

void Warner::check_readings() {
    const std::size_t readings = fit_.readings.size();
    const std::size_t fitted = readings - fit_.degrees_of_freedom;
    if (fit_.degrees_of_freedom == 0)
        warn(FitCaution::no_freedom,
             "as many parameters as readings: the curve passes through them, and nothing tells how "
             "good it is");
    else if (readings < 2 * fitted)
        warn(FitCaution::few_readings, std::to_string(readings) + " readings for " +
                                           std::to_string(fitted) +
                                           " parameters are few: take the intervals with care");
    if (fit_.lag_one_correlation && *fit_.lag_one_correlation > kTooCorrelated)
        warn(FitCaution::correlated_residuals,
             "neighbouring residuals are correlated (" + fixed(*fit_.lag_one_correlation, 2) +
                 "): the intervals are too narrow, and the law may not suit the soil");
    if (!fit_.converged)
        warn(FitCaution::not_converged, "the fit did not settle; do not use its numbers");
}

void Warner::check_horton() {
    const double fc = fit_.parameters[1].value;
    const double k = fit_.parameters[2].value;
    if (k > 0.0 && k * longest_h() < 1.0)
        warn(FitCaution::shorter_than_decay, "the test is shorter than 1/k, " + fixed(60.0 / k, 0) +
                                                 " min: the final capacity is an extrapolation");
    if (fit_.parameters[1].kind != EstimateKind::fitted) return;
    for (const InfiltrationTest& test : tests_) {
        const auto last = std::span(test.readings).last(std::min(kLastRates, test.readings.size()));
        const bool above = std::ranges::all_of(last, [&](const TestReading& reading) {
            return fc > kClearlyAbove * reading.rate_mm_per_h;
        });
        if (above)
            warn(FitCaution::final_above_last_rates,
                 "the final capacity, " + fixed(fc, 1) + " mm/h, lies above the last rates read" +
                     (tests_.size() > 1 ? " in pit " + test.pit : ""));
    }
}

void Warner::check_rise() {
    const bool is_power = fit_.law == FieldLaw::kostiakov;
    if (is_power && fit_.parameters[1].value > 1.0)
        warn(FitCaution::rising_rate,
             "the exponent is above 1: the rate would rise with time, which no soil does for long");
}

}  // namespace

std::string_view words_of_parameter(std::string_view key) {
    constexpr std::array<std::pair<std::string_view, std::string_view>, 9> kWords{{
        {"initial_capacity_mm_per_h", "initial capacity"},
        {"final_capacity_mm_per_h", "final capacity"},
        {"decay_per_h", "decay"},
        {"effective_conductivity_mm_per_h", "effective conductivity"},
        {"suction_deficit_mm", "suction-deficit product"},
        {"sorptivity_mm_per_sqrt_h", "sorptivity"},
        {"steady_term_mm_per_h", "steady term"},
        {"coefficient_mm", "coefficient"},
        {"exponent", "exponent"},
    }};
    return std::ranges::find(kWords, key, [](const auto& pair) { return pair.first; })->second;
}

std::vector<FitWarning> law_warnings(const LawFit& fit, std::span<const InfiltrationTest> tests) {
    return Warner(fit, tests).warnings();
}

}  // namespace rainledger
