#include "chart/text_losses.hpp"

#include <algorithm>
#include <cmath>
#include <vector>

#include "chart/look.hpp"
#include "chart/storm_view.hpp"
#include "chart/supply_strip.hpp"
#include "chart/text_blocks.hpp"
#include "chart/words.hpp"
#include "rainledger/base/printable.hpp"
#include "rainledger/report/caution.hpp"

namespace rainledger {
namespace {

constexpr std::string_view kInfiltratedGlyph = "░";
constexpr std::string_view kStoredGlyph = "▒";
constexpr std::string_view kExcessGlyph = "█";

/// The rates that each text column shows.
std::vector<StepRates> column_rates(const LossView& view, const ChartUnits& units, double span,
                                    std::size_t columns) {
    const std::vector<StepRates> rates = step_rates(view, units);
    const std::vector<double> weight = supply_weight(rates);
    std::vector<StepRates> out;
    for (const std::size_t step :
         steps_of_columns(view.storm->rain, rates.size(), weight, span, columns))
        out.push_back(step == kNoStep ? StepRates{} : rates[step]);
    return out;
}

template <class Of>
std::vector<double> each(const std::vector<StepRates>& rates, const Of& of) {
    std::vector<double> out;
    out.reserve(rates.size());
    for (const StepRates& rate : rates)
        out.push_back(of(rate));
    return out;
}

double supply_of(const StepRates& rate) {
    return rate.rain + rate.run_on;
}

std::string_view glyph_at(const StepRates& rate, double height) {
    if (height < rate.infiltrated) return kInfiltratedGlyph;
    if (height < kept(rate)) return kStoredGlyph;
    return height < kept(rate) + rate.excess ? kExcessGlyph : " ";
}

std::string supply_part(const std::vector<StepRates>& columns, bool run_on,
                        const ChartUnits& units) {
    constexpr std::size_t kRows = 4;
    const double peak = peak_supply(columns);
    const std::vector<Tick> ticks = round_ticks(peak, 3);
    const auto blocks = hanging_blocks(each(columns, supply_of), ticks.back().at, kRows);
    std::string out =
        (run_on ? "rain and run-on, " : "rain, ") + std::string(units.rate_unit()) + "\n";
    for (std::size_t row = 0; row < kRows; ++row) {
        const std::string_view scale =
            row == 0 ? "0" : (row + 1 == kRows ? std::string_view(ticks.back().label) : "");
        out += scaled_row(scale, blocks[row]);
    }
    return out;
}

std::string rates_part(const std::vector<StepRates>& columns, const ChartUnits& units) {
    double most = 0.0;
    for (const StepRates& rate : columns)
        most = std::max(most, kept(rate) + rate.excess);
    const std::vector<Tick> ticks = round_ticks(most, 3);
    const std::size_t rows_per_tick = rows_between_ticks(ticks);
    const std::size_t rows = (ticks.size() - 1) * rows_per_tick;
    std::string out = "where it goes, " + std::string(units.rate_unit()) + "\n";
    for (std::size_t row = 0; row < rows; ++row) {
        const double height =
            ticks.back().at * (static_cast<double>(rows - row) - 0.5) / static_cast<double>(rows);
        std::string line;
        for (const StepRates& rate : columns)
            line += glyph_at(rate, height);
        const std::size_t tick = ticks.size() - 1 - row / rows_per_tick;
        out += scaled_row(row % rows_per_tick == 0 ? ticks[tick].label : "", line);
    }
    return out;
}

/// A mark under every column in which the surface is ponded at some time.
std::string ponded_row(const LossView& view, std::size_t columns) {
    const Hyetograph& rain = view.storm->rain;
    const double per_column = span_h(rain) / static_cast<double>(columns);
    std::vector<std::string_view> marks(columns, " ");
    for (const PondedInterval& interval : view.ponding) {
        const double from = (interval.start_h - rain.edges_h.front()) / per_column;
        const double to = interval.end_h ? (*interval.end_h - rain.edges_h.front()) / per_column
                                         : static_cast<double>(columns);
        const auto end = std::min(static_cast<std::size_t>(std::ceil(to)), columns);
        for (auto column = static_cast<std::size_t>(from); column < end; ++column)
            marks[column] = "▬";
    }
    std::string line;
    for (const std::string_view mark : marks)
        line += mark;
    return padded("ponded", kGutter) + line.substr(0, line.find_last_not_of(' ') + 1) + "\n";
}

std::string accounts_part(const Accounts& total, const ChartUnits& units) {
    constexpr std::size_t kDepthColumns = 12;
    constexpr double kBarColumns = 70.0;
    const double supply = total.rain_mm + total.run_on_mm;
    std::string out;
    const auto bar = [&](std::string_view name, double mm, std::string_view glyph) {
        if (mm == 0.0) return;
        const auto length =
            supply > 0.0 ? std::lround(std::clamp(mm / supply, 0.0, 1.0) * kBarColumns) : 0;
        out += padded(name, 16) + padded(units.depth_words(mm), kDepthColumns) +
               repeated(glyph, static_cast<std::size_t>(std::max(length, 1L))) + "\n";
    };
    bar(total.run_on_mm > 0.0 ? "rain and run-on" : "rain", supply, "─");
    bar("infiltrated", total.infiltrated_mm, kInfiltratedGlyph);
    bar("initial loss", total.initial_loss_mm, kStoredGlyph);
    bar("ponded", total.ponded_mm, kStoredGlyph);
    bar("excess", total.excess_mm, kExcessGlyph);
    return out;
}

std::string ledger(std::string_view title, const ChosenLosses& losses, const ChartUnits& units) {
    const LossView& view = losses.views.front();
    const double span = span_h(view.storm->rain);
    const std::vector<StepRates> columns = column_rates(view, units, span, kTextWidth);
    std::string out = text_title(title, ledger_words(losses, units, kGutter + kTextWidth));
    out +=
        supply_part(columns, view.total.run_on_mm > 0.0, units) + "\n" + rates_part(columns, units);
    out += time_rows(time_axis(view.storm->rain, 9), kTextWidth);
    if (!view.ponding.empty()) out += ponded_row(view, kTextWidth);
    return out + "\n" + accounts_part(view.total, units);
}

std::string side_by_side(std::string_view title, const ChosenLosses& losses,
                         const ChartUnits& units) {
    constexpr std::size_t kRows = 2;
    double longest_h = 0.0;
    double peak = 0.0;
    for (const LossView& view : losses.views) {
        longest_h = std::max(longest_h, span_h(view.storm->rain));
        peak = std::max(peak, peak_supply(step_rates(view, units)));
    }
    const Tick top = round_ticks(peak, 2).back();
    std::string out = text_title(
        title, losses.about + "; full height " + top.label + " " + std::string(units.rate_unit()));
    for (const LossView& view : losses.views) {
        const auto columns = column_rates(view, units, longest_h, kTextWidth);
        const auto excess = [](const StepRates& rate) { return rate.excess; };
        out += shortened(printable(view.name), kNameColumns) +
               (view.method.empty() ? "" : " (" + view.method + ")") + ": " +
               excess_words(view, "coefficient", units) + "\n";
        out += labelled_rows("supply", standing_blocks(each(columns, supply_of), top.at, kRows));
        out +=
            labelled_rows("excess", standing_blocks(each(columns, excess), top.at, kRows)) + "\n";
    }
    return out + time_rows(losses.same_storm ? time_axis(losses.views.front().storm->rain, 9)
                                             : shared_time_axis(longest_h, 9),
                           kTextWidth);
}

}  // namespace

std::string text_losses(std::string_view title, const ChosenLosses& losses,
                        const ChartUnits& units) {
    std::string out = losses.views.size() == 1 && losses.views.front().surface != nullptr
                          ? ledger(title, losses, units)
                          : side_by_side(title, losses, units);
    return out + "\n" + std::string(kCaution) + "\n";
}

}  // namespace rainledger
