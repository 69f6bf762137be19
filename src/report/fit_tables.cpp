#include <algorithm>
#include <array>
#include <cstddef>

#include <fmt/core.h>

#include "rainledger/base/number.hpp"
#include "report/fit_summary_parts.hpp"
#include "report/lookup_parts.hpp"
#include "report/text_table.hpp"

namespace rainledger {
namespace {

constexpr double kMinutesPerHour = 60.0;
constexpr std::string_view kNone = "-";

/// An error of depth, finer than a depth.
std::string error_number(double mm, const Display& display) {
    const auto unit = find_unit(display.depth_unit(), Dimension::depth);
    return fixed(unit->from_canonical(mm), display.depth_unit() == "mm" ? 2 : 3);
}

std::string interval_words(const ParameterEstimate& estimate, const Display& display) {
    switch (estimate.kind) {
        case EstimateKind::on_bound:
            return "on its bound";
        case EstimateKind::held:
            return "held";
        case EstimateKind::unlimited:
            return "unlimited";
        case EstimateKind::fitted:
            break;
    }
    if (!estimate.low) return "none";
    return parameter_number(estimate.key, *estimate.low, display) + " to " +
           parameter_number(estimate.key, *estimate.high, display);
}

std::string optional_number(const std::optional<double>& value, int decimals) {
    return value ? fixed(*value, decimals) : std::string(kNone);
}

void add_law(TextTable& table, const RankedLaw& ranked, const LawFit& fit, bool with_design,
             const Display& display) {
    std::vector<std::string> head{std::string(field_law_name(fit.law)), "", ""};
    if (with_design) head.emplace_back();
    head.push_back(error_number(fit.rmse_mm, display));
    head.push_back(optional_number(ranked.aicc_above_best, 1));
    head.push_back(fixed(fit.r_squared, 4));
    head.push_back(optional_number(fit.lag_one_correlation, 2));
    table.row(std::move(head));
    for (const ParameterEstimate& estimate : fit.parameters) {
        const auto number = [&](double value) {
            return estimate.kind == EstimateKind::unlimited
                       ? std::string(kNone)
                       : parameter_number(estimate.key, value, display);
        };
        std::vector<std::string> row{"  " + parameter_label(estimate.key, display),
                                     number(estimate.value), interval_words(estimate, display)};
        if (with_design) row.push_back(number(estimate.design_value));
        table.row(std::move(row));
    }
}

struct LineNumbers {
    double initial_mm_per_h;
    double final_mm_per_h;
    double decay_per_h;
    double rmse_mm;
};

std::vector<std::string> line_row(std::string name, const LineNumbers& numbers,
                                  const Display& display) {
    return {std::move(name), display.rate(numbers.initial_mm_per_h),
            display.rate(numbers.final_mm_per_h), fixed(numbers.decay_per_h, 2),
            error_number(numbers.rmse_mm, display)};
}

std::string_view place_words(RatePlace place) {
    return place == RatePlace::interval_end ? "ends" : "middles";
}

void add_line(TextTable& table, const LineFit& fit, const Display& display) {
    const HortonLine& line = *fit.answer.line;
    auto row = line_row(fmt::format("line on interval {}", place_words(fit.place)),
                        {line.curve.initial_capacity_mm_per_h, line.curve.final_capacity_mm_per_h,
                         line.curve.decay_per_h, *fit.rmse_mm},
                        display);
    row.push_back(std::to_string(line.used));
    row.push_back(std::to_string(line.left_out));
    row.push_back(fixed(line.r_squared, 4));
    table.row(std::move(row));
    if (!fit.bias) return;
    table.row(line_row("  less the fit",
                       {fit.bias->initial_capacity_mm_per_h, fit.bias->final_capacity_mm_per_h,
                        fit.bias->decay_per_h, fit.bias->rmse_mm},
                       display));
}

void add_nonlinear(TextTable& table, const TestFit& pit, const Display& display) {
    const auto answer = std::ranges::find(pit.laws, FieldLaw::horton, &LawFitAnswer::law);
    if (answer == pit.laws.end() || !answer->fit) return;
    const LawFit& fit = *answer->fit;
    auto row = line_row(
        "nonlinear fit",
        {fit.parameters[0].value, fit.parameters[1].value, fit.parameters[2].value, fit.rmse_mm},
        display);
    row.push_back(std::to_string(fit.readings.size()));
    table.row(std::move(row));
}

bool has_line(const TestFit& pit) {
    return std::ranges::any_of(pit.lines,
                               [](const LineFit& line) { return line.answer.line.has_value(); });
}

TextTable line_table(const Display& display) {
    TextTable table;
    const std::string rate(display.rate_unit());
    table.column("", Align::left);
    table.column("initial|" + rate, Align::point);
    table.column("final|" + rate, Align::point);
    table.column("decay|1/h", Align::point);
    table.column("RMSE|" + std::string(display.depth_unit()), Align::point);
    table.column("rates|used", Align::right);
    table.column("left|out", Align::right);
    table.column("R2 of|line", Align::point);
    return table;
}

}  // namespace

std::string readings_part(const TestFit& pit, const Display& display) {
    constexpr std::size_t kMost = 14;  // rows of a table that shows them all
    constexpr std::size_t kAtEitherEnd = 6;
    const auto& readings = pit.test.readings;
    TextTable table;
    const std::string depth(display.depth_unit());
    table.column("reading", Align::right);
    table.column("to|min", Align::point);
    table.column("in the interval|" + depth, Align::point);
    table.column("so far|" + depth, Align::point);
    table.column("rate|" + std::string(display.rate_unit()), Align::point);
    for (std::size_t i = 0; i < readings.size(); ++i) {
        if (readings.size() > kMost && i == kAtEitherEnd) {
            table.row({"..."});
            i = readings.size() - kAtEitherEnd;
        }
        const TestReading& reading = readings[i];
        table.row({std::to_string(pit.ignored_readings + i + 1),
                   four_figures(reading.end_h * kMinutesPerHour),
                   display.depth(reading.interval_mm), display.depth(reading.depth_mm),
                   display.rate(reading.rate_mm_per_h)});
    }
    std::string out = "Readings\n" + table.text();
    if (readings.size() > kMost) out += "  Those between stand in the CSV.\n";
    return out;
}

std::string laws_part(const RankedFits& fits, const FieldFitOptions& options,
                      const Display& display) {
    if (fits.ranking.empty()) return "Laws\n  No law could be fitted.\n";
    const bool with_design = options.design_factor > 1.0;
    TextTable table;
    table.column("", Align::left);
    table.column("fitted", Align::point);
    table.column("95 % interval", Align::right);
    if (with_design) table.column("for|design", Align::point);
    table.column("RMSE|" + std::string(display.depth_unit()), Align::point);
    table.column("AICc|above|best", Align::point);
    table.column("R2", Align::point);
    table.column("lag-1", Align::point);
    for (const RankedLaw& ranked : fits.ranking)
        add_law(table, ranked, *fits.laws[ranked.index].fit, with_design, display);
    return "Laws, ranked by AICc\n" + table.text();
}

std::string laws_notes(const RankedFits& fits, const FieldFitOptions& options) {
    if (fits.ranking.empty()) return {};
    const LawFit& best = *fits.laws[fits.ranking.front().index].fit;
    std::string out = best.on_intervals
                          ? "Nonlinear least squares on interval depths, as readings taken apart "
                            "have errors that add up"
                          : "Nonlinear least squares on cumulative depth";
    out +=
        "; 95 % intervals by the delta method; RMSE and R2 on cumulative depth; lag-1: correlation "
        "of "
        "neighbouring residuals.";
    if (fits.ranking.size() > 1)
        out +=
            " Laws less than 2 apart in AICc fit equally well, and one more than 10 above the "
            "best has little for it; with few readings it prefers few parameters (common "
            "practice).";
    if (options.design_factor > 1.0)
        out += " For design, rates are divided by " + four_figures(options.design_factor) +
               " as asked; the fitted values are not.";
    return filled("  ", out, "  ", kFitWidth);
}

std::string lines_part(const TestFit& pit, const Display& display) {
    std::string out = "Horton by the straight line of ln(f - fc) on time, beside the fit\n";
    TextTable table = line_table(display);
    add_nonlinear(table, pit, display);
    std::string problems;
    for (const LineFit& line : pit.lines) {
        if (line.answer.line)
            add_line(table, line, display);
        else
            problems +=
                filled(fmt::format("  On interval {} there is no line: ", place_words(line.place)),
                       line.answer.problem + ".", "      ", kFitWidth);
    }
    if (has_line(pit)) out += table.text();
    return out + problems;
}

std::string lines_notes(std::span<const TestFit> pits) {
    if (std::ranges::none_of(pits, has_line)) return {};
    return filled(
        "  ",
        "The straight line is biased: its logarithms give the rates near the final one, which are "
        "mostly error, the most weight, and rates at or below it are left out. Take the "
        "fit.",
        "  ", kFitWidth);
}

std::string spread_part(const PooledFit& pooled, const Display& display) {
    TextTable table;
    table.column("", Align::left);
    table.column("mean", Align::point);
    table.column("smallest", Align::point);
    table.column("largest", Align::point);
    table.column("standard|deviation", Align::point);
    std::optional<FieldLaw> law;
    for (const PitSpread& spread : pooled.spread) {
        const auto number = [&](double value) {
            return parameter_number(spread.key, value, display);
        };
        if (law != spread.law) table.row({std::string(field_law_name(spread.law))});
        law = spread.law;
        table.row({"  " + parameter_label(spread.key, display), number(spread.mean),
                   number(spread.smallest), number(spread.largest),
                   spread.deviation ? number(*spread.deviation) : std::string(kNone)});
    }
    return "Between the pits, each fitted alone\n" + table.text() +
           filled("  ",
                  "The spread between the pits, not the interval of the fit to all of them, is the "
                  "uncertainty of the site.",
                  "  ", kFitWidth);
}

}  // namespace rainledger
