#include "chart/text_hyetograph.hpp"

#include <algorithm>
#include <vector>

#include "chart/storm_view.hpp"
#include "chart/text_blocks.hpp"
#include "chart/words.hpp"
#include "rainledger/base/printable.hpp"
#include "rainledger/report/caution.hpp"

namespace rainledger {
namespace {

std::vector<double> column_rates(const Hyetograph& own, const ChartUnits& units, double span,
                                 std::size_t columns) {
    const std::vector<double> rates = intensities(own);
    std::vector<double> out;
    for (const std::size_t step : steps_of_columns(own, own.steps(), rates, span, columns))
        out.push_back(step == kNoStep ? 0.0 : units.shown(rates[step]));
    return out;
}

std::string one_storm(const Scenario& scenario, const Storm& storm, const ChartUnits& units) {
    const Hyetograph own = own_rain(storm.rain);
    const std::vector<double> columns = column_rates(own, units, span_h(own), kTextWidth);
    const double peak = *std::max_element(columns.begin(), columns.end());
    const std::vector<Tick> ticks = round_ticks(peak, 4);
    const std::size_t rows_per_tick = rows_between_ticks(ticks);
    const std::size_t rows = (ticks.size() - 1) * rows_per_tick;
    const auto blocks = standing_blocks(columns, ticks.back().at, rows);
    std::string out =
        text_title(scenario.title, joined(storm_words(storm), rain_words(own, units)));
    out += std::string(units.rate_unit()) + "\n";
    for (std::size_t row = 0; row < rows; ++row) {
        const std::size_t tick = ticks.size() - 1 - row / rows_per_tick;
        out += scaled_row(row % rows_per_tick == 0 ? ticks[tick].label : "", blocks[row]);
    }
    return out + time_rows(time_axis(own, 9), kTextWidth);
}

std::string several_storms(const Scenario& scenario, const ChartUnits& units) {
    constexpr std::size_t kRows = 2;
    double longest_h = 0.0;
    double peak = 0.0;
    std::vector<Hyetograph> storms;
    for (const Storm& storm : scenario.storms) {
        storms.push_back(own_rain(storm.rain));
        longest_h = std::max(longest_h, span_h(storms.back()));
        peak = std::max(peak, units.shown(peak_intensity_mm_per_h(storms.back())));
    }
    const Tick top = round_ticks(peak, 2).back();
    std::string out = text_title(scenario.title, "rain of each storm; full height " + top.label +
                                                     " " + std::string(units.rate_unit()));
    for (std::size_t i = 0; i < storms.size(); ++i) {
        const auto columns = column_rates(storms[i], units, longest_h, kTextWidth);
        out += shortened(printable(scenario.storms[i].name), kNameColumns) + ": " +
               short_rain_words(storms[i], units) + "\n" +
               labelled_rows("", standing_blocks(columns, top.at, kRows)) + "\n";
    }
    return out + time_rows(shared_time_axis(longest_h, 9), kTextWidth);
}

}  // namespace

std::string text_hyetograph(const Scenario& scenario, const ChartUnits& units) {
    const std::string out = scenario.storms.size() == 1
                                ? one_storm(scenario, scenario.storms[0], units)
                                : several_storms(scenario, units);
    return out + "\n" + std::string(kRainCaution) + "\n";
}

}  // namespace rainledger
