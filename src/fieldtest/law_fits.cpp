#include "rainledger/fieldtest/law_fits.hpp"

#include <algorithm>
#include <cmath>
#include <utility>

#include "fieldtest/law_model.hpp"
#include "fieldtest/law_warnings.hpp"
#include "fieldtest/residuals.hpp"
#include "fieldtest/student.hpp"

namespace rainledger {
namespace {

constexpr std::size_t kCurvePoints = 121;
constexpr std::size_t kFinal = 1;  // fc among Horton's own parameters

using Tests = std::span<const InfiltrationTest>;

LeastSquaresProblem problem_of(FieldLaw law, std::span<const DepthSpan> spans,
                               const LawFitOptions& options) {
    LeastSquaresProblem problem;
    for (const DepthSpan& span : spans)
        problem.observed.push_back(span.depth_mm);
    problem.ranges = law_ranges(law, spans);
    problem.starts = law_starts(law, spans);
    if (law == FieldLaw::horton && options.final_capacity_mm_per_h) {
        const double fc = *options.final_capacity_mm_per_h;
        problem.ranges[kFinal] = {fc, fc};
        for (auto& start : problem.starts)
            start[kFinal] = fc;
    }
    problem.model = [law, spans](std::span<const double> own, std::span<double> values) {
        for (std::size_t i = 0; i < spans.size(); ++i)
            values[i] = law_growth(law, own, spans[i].from_h, spans[i].to_h);
    };
    problem.slopes = [law, spans](std::span<const double> own, std::span<double> slopes) {
        for (std::size_t i = 0; i < spans.size(); ++i) {
            const LawSlopes to = law_slopes(law, own, spans[i].to_h);
            LawSlopes from{};
            if (spans[i].from_h > 0.0) from = law_slopes(law, own, spans[i].from_h);
            for (std::size_t j = 0; j < own.size(); ++j)
                slopes[i * own.size() + j] = to[j] - from[j];
        }
    };
    return problem;
}

/// Turns a least-squares fit into what is reported of a law.
class Reporter {
public:
    Reporter(FieldLaw law, Tests tests, const LawFitOptions& options, const LeastSquaresFit& own)
        : tests_(tests), options_(options), own_(own) {
        fit_.law = law;
    }

    LawFit report();

private:
    void add_parameters();
    void add_covariance(const std::vector<ReportedParameter>& reported);
    void add_intervals();
    void add_readings();
    void add_curve();
    void add_quality();
    [[nodiscard]] bool is_held(std::string_view key) const;
    [[nodiscard]] std::size_t parameters_to_fit() const;

    Tests tests_;
    const LawFitOptions& options_;
    const LeastSquaresFit& own_;
    LawFit fit_;
};

bool Reporter::is_held(std::string_view key) const {
    return options_.final_capacity_mm_per_h && key == "final_capacity_mm_per_h";
}

void Reporter::add_parameters() {
    const auto reported = reported_parameters(fit_.law, own_.parameters, own_.standing);
    for (const ReportedParameter& parameter : reported) {
        ParameterEstimate estimate;
        estimate.key = parameter.key;
        estimate.value = parameter.value;
        estimate.kind = is_held(parameter.key) ? EstimateKind::held : parameter.kind;
        estimate.design_value =
            parameter.scales_with_rate ? parameter.value / options_.design_factor : parameter.value;
        fit_.parameters.push_back(estimate);
    }
    if (!own_.covariance.empty()) add_covariance(reported);
}

/// G C G', G the derivatives of what is reported by what was fitted.
void Reporter::add_covariance(const std::vector<ReportedParameter>& reported) {
    const std::size_t n = reported.size();
    fit_.covariance.assign(n * n, 0.0);
    for (std::size_t a = 0; a < n; ++a)
        for (std::size_t b = 0; b < n; ++b) {
            const bool fitted = fit_.parameters[a].kind == EstimateKind::fitted &&
                                fit_.parameters[b].kind == EstimateKind::fitted;
            if (!fitted) continue;
            for (std::size_t i = 0; i < n; ++i)
                for (std::size_t j = 0; j < n; ++j)
                    fit_.covariance[a * n + b] +=
                        reported[a].by_own[i] * own_.covariance[i * n + j] * reported[b].by_own[j];
        }
    add_intervals();
}

void Reporter::add_intervals() {
    const std::size_t n = fit_.parameters.size();
    const double student = student_95(own_.degrees_of_freedom);
    for (std::size_t a = 0; a < n; ++a) {
        ParameterEstimate& estimate = fit_.parameters[a];
        if (estimate.kind != EstimateKind::fitted) continue;
        estimate.standard_error = std::sqrt(fit_.covariance[a * n + a]);
        estimate.low = estimate.value - student * *estimate.standard_error;
        estimate.high = estimate.value + student * *estimate.standard_error;
    }
}

void Reporter::add_readings() {
    for (std::size_t test = 0; test < tests_.size(); ++test)
        for (const TestReading& reading : tests_[test].readings) {
            const auto growth = [&](double from_h) {
                return law_growth(fit_.law, own_.parameters, from_h, reading.end_h);
            };
            FittedReading fitted;
            fitted.test = test;
            fitted.row = reading.row;
            fitted.end_h = reading.end_h;
            fitted.depth_mm = reading.depth_mm;
            fitted.fitted_depth_mm = growth(tests_[test].from_h);
            fitted.residual_mm = fitted.depth_mm - fitted.fitted_depth_mm;
            fitted.rate_mm_per_h = reading.rate_mm_per_h;
            fitted.fitted_rate_mm_per_h =
                growth(reading.start_h) / (reading.end_h - reading.start_h);
            fit_.readings.push_back(fitted);
        }
}

/// Points crowd at the beginning, where the curve bends.
void Reporter::add_curve() {
    double from_h = tests_.front().from_h;
    double to_h = 0.0;
    for (const InfiltrationTest& test : tests_) {
        from_h = std::min(from_h, test.from_h);
        to_h = std::max(to_h, test.readings.back().end_h);
    }
    for (std::size_t i = 0; i < kCurvePoints; ++i) {
        const double share = static_cast<double>(i) / static_cast<double>(kCurvePoints - 1);
        const double time_h =
            i + 1 == kCurvePoints ? to_h : from_h + share * share * (to_h - from_h);
        const double depth_mm =
            i == 0 ? 0.0 : law_growth(fit_.law, own_.parameters, from_h, time_h);
        fit_.curve.push_back({time_h, depth_mm, law_rate(fit_.law, own_.parameters, time_h)});
    }
}

std::size_t Reporter::parameters_to_fit() const {
    const auto held =
        std::ranges::count(fit_.parameters, EstimateKind::held, &ParameterEstimate::kind);
    return fit_.parameters.size() - static_cast<std::size_t>(held);
}

void Reporter::add_quality() {
    const DepthErrors errors = depth_errors(fit_.readings);
    fit_.rmse_mm = errors.rmse_mm;
    fit_.r_squared = errors.r_squared;
    fit_.on_intervals = errors_add_up(tests_.front().kind);
    fit_.residual_sum_mm2 = own_.residual_sum;
    fit_.degrees_of_freedom = own_.degrees_of_freedom;
    fit_.residual_deviation_mm = own_.residual_deviation;
    fit_.condition = own_.condition;
    fit_.converged = own_.converged;
    const auto spans = depth_spans(tests_);
    double largest_mm = 0.0;
    for (const DepthSpan& span : spans)
        largest_mm = std::max(largest_mm, span.depth_mm);
    fit_.aicc = corrected_akaike(own_.residual_sum, largest_mm, spans.size(), parameters_to_fit());
    fit_.lag_one_correlation = lag_one_correlation(tests_, spans, own_.values);
}

LawFit Reporter::report() {
    add_parameters();
    add_readings();
    add_curve();
    add_quality();
    fit_.warnings = law_warnings(fit_, tests_);
    return std::move(fit_);
}

}  // namespace

std::string_view field_law_key(FieldLaw law) {
    constexpr std::array<std::string_view, kFieldLaws.size()> kKeys{
        "horton", "green_ampt", "philip", "kostiakov", "modified_kostiakov"};
    return kKeys[static_cast<std::size_t>(law)];
}

std::string_view field_law_name(FieldLaw law) {
    constexpr std::array<std::string_view, kFieldLaws.size()> kNames{
        "Horton", "Green-Ampt", "Philip", "Kostiakov", "modified Kostiakov"};
    return kNames[static_cast<std::size_t>(law)];
}

LawFitAnswer fit_law(std::span<const InfiltrationTest> tests, FieldLaw law,
                     const LawFitOptions& options) {
    const std::vector<DepthSpan> spans = depth_spans(tests);
    const bool holds = law == FieldLaw::horton && options.final_capacity_mm_per_h;
    const std::size_t wanted = law_parameter_count(law) - (holds ? 1 : 0);
    if (spans.size() < wanted)
        return {law,
                {},
                "it takes at least " + std::to_string(wanted) + " readings, and there are " +
                    std::to_string(spans.size())};
    if (std::ranges::none_of(spans, [](const DepthSpan& span) { return span.depth_mm > 0.0; }))
        return {law, {}, "nothing has infiltrated"};
    const LeastSquaresAnswer answer = fit_least_squares(problem_of(law, spans, options));
    if (!answer.fit) return {law, {}, answer.problem};
    return {law, Reporter(law, tests, options, *answer.fit).report(), {}};
}

std::vector<RankedLaw> rank_laws(std::span<const LawFitAnswer> answers) {
    std::vector<RankedLaw> ranking;
    for (std::size_t i = 0; i < answers.size(); ++i)
        if (answers[i].fit) ranking.push_back({answers[i].law, i, {}});
    const auto before = [&](const RankedLaw& a, const RankedLaw& b) {
        const LawFit& first = *answers[a.index].fit;
        const LawFit& second = *answers[b.index].fit;
        if (first.aicc && second.aicc) return *first.aicc < *second.aicc;
        if (first.aicc || second.aicc) return first.aicc.has_value();
        return first.rmse_mm < second.rmse_mm;
    };
    std::ranges::stable_sort(ranking, before);
    for (RankedLaw& ranked : ranking) {
        const auto& aicc = answers[ranked.index].fit->aicc;
        if (aicc) ranked.aicc_above_best = *aicc - *answers[ranking.front().index].fit->aicc;
    }
    return ranking;
}

}  // namespace rainledger
