#include "rainledger/fieldtest/field_fit.hpp"

#include <algorithm>
#include <cmath>
#include <utility>

#include "fieldtest/pooled_fit.hpp"
#include "rainledger/base/number.hpp"

namespace rainledger {
namespace {

std::vector<std::string> problems_of(const FieldFitOptions& options) {
    std::vector<std::string> problems;
    if (options.laws.empty()) problems.push_back("no law is asked for");
    for (auto law = options.laws.begin(); law != options.laws.end(); ++law)
        if (std::find(options.laws.begin(), law, *law) != law)
            problems.push_back(std::string(field_law_name(*law)) + " is asked for twice");
    const bool fixed = options.steady_use == SteadyUse::fixed;
    const double rate = options.fixed_rate_mm_per_h;
    if (fixed && !(rate >= 0.0 && std::isfinite(rate)))
        problems.push_back("the fixed steady rate is negative or not finite");
    if (!(options.ignore_first_h >= 0.0 && std::isfinite(options.ignore_first_h)))
        problems.push_back("the time to ignore is negative or not finite");
    if (!(options.design_factor >= 1.0 && std::isfinite(options.design_factor)))
        problems.push_back("the design factor is below 1 or not finite: it divides the rates");
    return problems;
}

/// Fits one pit.
class PitFitter {
public:
    PitFitter(const InfiltrationTest& whole, InfiltrationTest test, const FieldFitOptions& options)
        : options_(options) {
        fit_.ignored_readings = whole.readings.size() - test.readings.size();
        fit_.test = std::move(test);
    }

    TestFit fit();

private:
    void judge_steadiness();
    void fit_lines();
    void add_bias(LineFit& line, const HortonLine& found) const;
    void drop_the_end();
    void warn_of_steadiness();
    void warn_of_dependence();
    void warn_of_noise();
    [[nodiscard]] double line_rmse(const HortonCurve& curve) const;
    [[nodiscard]] std::optional<double> held_final() const;
    [[nodiscard]] const LawFit* horton() const;

    const FieldFitOptions& options_;
    TestFit fit_;
};

std::optional<double> PitFitter::held_final() const {
    if (options_.steady_use == SteadyUse::fixed) return options_.fixed_rate_mm_per_h;
    if (options_.steady_use == SteadyUse::tail) return fit_.tail_rate().mean_mm_per_h;
    return std::nullopt;
}

const LawFit* PitFitter::horton() const {
    for (const LawFitAnswer& answer : fit_.laws)
        if (answer.law == FieldLaw::horton && answer.fit) return &*answer.fit;
    return nullptr;
}

void PitFitter::judge_steadiness() {
    for (const SteadyConvention convention : kSteadyConventions)
        fit_.steady.push_back(steady_rate(fit_.test, convention));
    const auto found = std::ranges::find(fit_.steady, true, &SteadyRate::steady);
    if (found != fit_.steady.end())
        fit_.tail = static_cast<std::size_t>(found - fit_.steady.begin());
}

double PitFitter::line_rmse(const HortonCurve& curve) const {
    const double before_mm = horton_cumulative(curve, fit_.test.from_h);
    double squares = 0.0;
    for (const TestReading& reading : fit_.test.readings) {
        const double depth_mm = horton_cumulative(curve, reading.end_h) - before_mm;
        squares += (reading.depth_mm - depth_mm) * (reading.depth_mm - depth_mm);
    }
    return std::sqrt(squares / static_cast<double>(fit_.test.readings.size()));
}

void PitFitter::add_bias(LineFit& line, const HortonLine& found) const {
    const LawFit* const fitted = horton();
    if (fitted == nullptr) return;
    line.bias = LineBias{found.curve.initial_capacity_mm_per_h - fitted->parameters[0].value,
                         found.curve.final_capacity_mm_per_h - fitted->parameters[1].value,
                         found.curve.decay_per_h - fitted->parameters[2].value,
                         *line.rmse_mm - fitted->rmse_mm};
}

void PitFitter::fit_lines() {
    const double fc = options_.steady_use == SteadyUse::fixed ? options_.fixed_rate_mm_per_h
                                                              : fit_.tail_rate().mean_mm_per_h;
    for (const RatePlace place : {RatePlace::interval_end, RatePlace::interval_middle}) {
        LineFit line;
        line.place = place;
        line.answer = fit_horton_line(fit_.test, place, fc);
        if (line.answer.line) {
            line.rmse_mm = line_rmse(line.answer.line->curve);
            add_bias(line, *line.answer.line);
        }
        fit_.lines.push_back(std::move(line));
    }
}

void PitFitter::drop_the_end() {
    constexpr std::size_t kFewestLeft = 4;
    const LawFit* const fitted = horton();
    if (fitted == nullptr || options_.steady_use != SteadyUse::fitted) return;
    InfiltrationTest shorter = fit_.test;
    const std::size_t left_out = (shorter.readings.size() + 3) / 4;
    if (shorter.readings.size() < kFewestLeft + left_out) return;
    shorter.readings.resize(shorter.readings.size() - left_out);
    const LawFitAnswer answer = fit_law({&shorter, 1}, FieldLaw::horton);
    if (!answer.fit) return;
    fit_.final_without_end =
        FinalWithoutEnd{left_out, fitted->parameters[1].value, answer.fit->parameters[1].value};
}

void PitFitter::warn_of_steadiness() {
    if (std::ranges::any_of(fit_.steady, &SteadyRate::steady)) return;
    const SteadyRate& three = fit_.steady.front();
    std::string text = "the test has fewer than three readings: nothing tells whether it is steady";
    if (three.relative_change)
        text = "the test stopped too early: its last three rates still differ by " +
               fixed(100.0 * *three.relative_change, 0) + " % of their mean, " +
               fixed(three.mean_mm_per_h, 1) + " mm/h, so that a final rate is an extrapolation";
    fit_.warnings.push_back({FitCaution::stopped_early, std::move(text)});
}

void PitFitter::warn_of_dependence() {
    constexpr double kTenth = 0.1;
    if (!fit_.final_without_end) return;
    const auto [left_out, with, without] = *fit_.final_without_end;
    if (!(std::abs(with - without) > kTenth * with)) return;
    fit_.warnings.push_back({FitCaution::final_depends_on_end,
                             "Horton: the final capacity hangs on the end of the test: " +
                                 fixed(with, 1) + " mm/h with all readings, " + fixed(without, 1) +
                                 " mm/h without the last " + std::to_string(left_out)});
}

/// Scatter about the law that fits best, interval by interval.
void PitFitter::warn_of_noise() {
    constexpr double kTooNoisy = 0.25;
    if (fit_.ranking.empty()) return;
    const RankedLaw best = fit_.ranking.front();
    const LawFit& fit = *fit_.laws[best.index].fit;
    double squares = 0.0;
    double sum_mm = 0.0;
    for (std::size_t i = 0; i < fit.readings.size(); ++i) {
        const double hours = fit_.test.readings[i].end_h - fit_.test.readings[i].start_h;
        const double off_mm =
            hours * (fit.readings[i].rate_mm_per_h - fit.readings[i].fitted_rate_mm_per_h);
        squares += off_mm * off_mm;
        sum_mm += fit_.test.readings[i].interval_mm;
    }
    const double n = static_cast<double>(fit.readings.size());
    const double scatter_mm = std::sqrt(squares / n);
    if (!(scatter_mm > kTooNoisy * sum_mm / n)) return;
    fit_.warnings.push_back(
        {FitCaution::noisy, "the readings are noisy: intervals scatter by " + fixed(scatter_mm, 1) +
                                " mm about the best law, against " + fixed(sum_mm / n, 1) +
                                " mm infiltrated in the mean interval"});
}

TestFit PitFitter::fit() {
    judge_steadiness();
    LawFitOptions law_options;
    law_options.final_capacity_mm_per_h = held_final();
    law_options.design_factor = options_.design_factor;
    for (const FieldLaw law : options_.laws) {
        fit_.laws.push_back(fit_law({&fit_.test, 1}, law, law_options));
        const LawFitAnswer& answer = fit_.laws.back();
        if (!answer.fit)
            fit_.warnings.push_back(
                {FitCaution::no_fit,
                 std::string(field_law_name(law)) + " could not be fitted: " + answer.problem});
    }
    fit_.ranking = rank_laws(fit_.laws);
    fit_lines();
    drop_the_end();
    warn_of_steadiness();
    warn_of_dependence();
    warn_of_noise();
    return std::move(fit_);
}

}  // namespace

FieldFitAnswer fit_field_tests(std::span<const InfiltrationTest> tests,
                               const FieldFitOptions& options) {
    FieldFitAnswer answer;
    answer.problems = problems_of(options);
    if (tests.empty()) answer.problems.push_back("there is no test");
    if (!answer.problems.empty()) return answer;
    FieldFit fit;
    fit.options = options;
    for (const InfiltrationTest& whole : tests) {
        InfiltrationTest test = without_first(whole, options.ignore_first_h);
        if (test.readings.empty())
            answer.problems.push_back((whole.pit.empty() ? "" : "pit " + whole.pit + ": ") +
                                      "no reading is left after the time to ignore");
        else if (answer.problems.empty())
            fit.pits.push_back(PitFitter(whole, std::move(test), options).fit());
    }
    if (!answer.problems.empty()) return answer;
    if (fit.pits.size() > 1) fit.pooled = pool_pits(fit.pits, options);
    answer.fit = std::move(fit);
    return answer;
}

}  // namespace rainledger
