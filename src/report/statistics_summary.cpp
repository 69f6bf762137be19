#include <algorithm>
#include <array>
#include <cstddef>
#include <string_view>

#include <fmt/core.h>

#include "rainledger/base/number.hpp"
#include "rainledger/report/storm_summary.hpp"
#include "report/rain_words.hpp"
#include "report/summary_parts.hpp"
#include "report/text_table.hpp"

namespace rainledger {
namespace {

constexpr std::size_t kColumnsPerTable = 10;
constexpr std::size_t kHangingIndent = 6;

std::string column_heading(const RainfallStatistics& statistics, std::size_t column) {
    if (statistics.return_period_yr.empty()) return "depth";
    return years_text(statistics.return_period_yr[column]);
}

/// Columns `from` up to `to` of the table.
std::string columns_text(const RainfallStatistics& statistics, std::size_t from, std::size_t to,
                         const Display& display) {
    TextTable table;
    table.column("duration", Align::left);
    for (std::size_t column = from; column < to; ++column)
        table.column(column_heading(statistics, column), Align::point);
    for (std::size_t row = 0; row < statistics.duration_h.size(); ++row) {
        std::vector<std::string> cells{duration_label(statistics.duration_h[row])};
        for (std::size_t column = from; column < to; ++column)
            cells.push_back(display.depth(statistics.at(row, column)));
        table.row(std::move(cells));
    }
    return table.text();
}

std::string depths_part(const RainfallStatistics& statistics, const Display& display) {
    const std::size_t columns = statistics.columns();
    std::string out = fmt::format("Depth of rain in {} by duration{}\n", display.depth_words(),
                                  statistics.return_period_yr.empty() ? "" : " and return period");
    for (std::size_t from = 0; from < columns; from += kColumnsPerTable)
        out += columns_text(statistics, from, std::min(from + kColumnsPerTable, columns), display);
    for (const std::string& words : statistics.set_aside)
        out += wrapped("  Not used: ", printable(words), kPageWidth, kHangingIndent);
    return out;
}

std::string_view form_words(FormulaForm form) {
    return form == FormulaForm::free_m ? "n = 1, m fitted" : "m = 1, n fitted";
}

/// Seven figures lose nothing that a fit could know.
std::string seven_figures(double value) {
    return fmt::format("{:.7g}", value);
}

/// The formula as a line of a scenario.
std::string scenario_line(const IntensityFormula& formula, const Display& display) {
    const std::string unit(display.rate_unit());
    const double a = find_unit(unit, Dimension::rate)->from_canonical(formula.a_mm_per_h);
    return fmt::format("formula: {{a: {} {}, b: {}, m: {}, n: {}, time: min}}", seven_figures(a),
                       unit, seven_figures(formula.b), seven_figures(formula.m),
                       seven_figures(formula.n));
}

/// Tabulated intensities with the residual of every fit.
std::string residuals_text(const ColumnFit& column, const Display& display) {
    TextTable table;
    table.column("duration", Align::left);
    table.column(fmt::format("table|{}", display.rate_unit()), Align::point);
    for (const FitAnswer& answer : column.fits)
        if (answer.fit)
            table.column(fmt::format("{}|off by %", form_words(answer.fit->form)), Align::point);
    for (std::size_t i = 0; i < column.list.duration_h.size(); ++i) {
        const double hours = column.list.duration_h[i];
        std::vector<std::string> cells{duration_label(hours),
                                       display.rate(column.list.depth_mm[i] / hours)};
        for (const FitAnswer& answer : column.fits)
            if (answer.fit) cells.push_back(fixed(100.0 * answer.fit->residual[i], 1));
        table.row(std::move(cells));
    }
    return table.text();
}

std::string fit_part(const ColumnFit& column, const Display& display) {
    std::string out = "\nFormula i = a / (t^m + b)^n fitted to ";
    out += column.return_period_yr ? "the depths of " + years_text(*column.return_period_yr)
                                   : std::string("the depths");
    out += "\n";
    const bool any = std::ranges::any_of(
        column.fits, [](const FitAnswer& answer) { return answer.fit.has_value(); });
    if (any) out += residuals_text(column, display);
    for (const FitAnswer& answer : column.fits) {
        if (!answer.fit) {
            out += wrapped("  No fit: ", answer.problem, kPageWidth, kHangingIndent);
            continue;
        }
        out +=
            fmt::format("  {}: off by {} % in the root mean square\n", form_words(answer.fit->form),
                        fixed(100.0 * answer.fit->rms_log_residual, 2));
        out += "    " + scenario_line(answer.fit->formula, display) + "\n";
    }
    return out;
}

}  // namespace

std::string statistics_summary(const std::string& title, const RainfallStatistics& statistics,
                               std::span<const ColumnFit> fits, const SummaryOptions& options) {
    const Display display(options.units);
    std::string out = printable(title) + "\n\n" + depths_part(statistics, display);
    for (const ColumnFit& column : fits)
        out += fit_part(column, display);
    if (!fits.empty())
        out +=
            "\n  Fitted by least squares on log intensity, t in minutes. A line as above goes "
            "into\n"
            "  a scenario under 'design:'; it holds between the durations of the table.\n";
    return out + rain_closing();
}

}  // namespace rainledger
