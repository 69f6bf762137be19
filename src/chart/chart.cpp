#include "rainledger/chart/chart.hpp"

#include <algorithm>
#include <cctype>
#include <utility>

#include "chart/finished_svg.hpp"
#include "chart/gnuplot.hpp"
#include "chart/hyetograph_drawing.hpp"
#include "chart/ledger_drawing.hpp"
#include "chart/loss_view.hpp"
#include "chart/side_by_side.hpp"
#include "chart/text_hyetograph.hpp"
#include "chart/text_losses.hpp"

namespace rainledger {
namespace {

Chart picture(const Drawing& drawing, std::string_view title, ChartFormat format) {
    Chart chart = run_gnuplot(drawing.script(format));
    if (chart.bytes && format == ChartFormat::svg)
        chart.bytes = finished_svg(std::move(*chart.bytes), title);
    return chart;
}

Chart too_many(std::size_t count, std::string_view what) {
    return {std::nullopt,
            "a chart holds " + std::to_string(kMostPanels) + " panels at most, and there are " +
                std::to_string(count) + " " + std::string(what),
            "choose one of them for its own chart", true};
}

}  // namespace

std::optional<ChartFormat> chart_format(std::string_view path) {
    if (path == "-") return ChartFormat::text;
    std::string lower(path);
    std::transform(lower.begin(), lower.end(), lower.begin(), [](char c) {
        return static_cast<char>(std::tolower(static_cast<unsigned char>(c)));
    });
    if (lower.ends_with(".svg")) return ChartFormat::svg;
    if (lower.ends_with(".png")) return ChartFormat::png;
    if (lower.ends_with(".pdf")) return ChartFormat::pdf;
    if (lower.ends_with(".txt")) return ChartFormat::text;
    return std::nullopt;
}

Chart hyetograph_chart(const Scenario& scenario, const ChartOptions& options) {
    if (scenario.storms.size() > kMostPanels) return too_many(scenario.storms.size(), "storms");
    const ChartUnits units(options.units);
    if (options.format == ChartFormat::text) return {text_hyetograph(scenario, units), {}, {}};
    return picture(hyetograph_drawing(scenario, units), scenario.title, options.format);
}

Chart losses_chart(const Scenario& scenario, std::span<const SiteLedger> ledgers,
                   const ChartChoice& choice, const ChartOptions& options) {
    const ChosenLosses losses = chosen_losses(scenario, ledgers, choice);
    if (losses.views.size() > kMostPanels) return too_many(losses.views.size(), losses.what);
    const ChartUnits units(options.units);
    if (options.format == ChartFormat::text)
        return {text_losses(scenario.title, losses, units), {}, {}};
    if (losses.views.size() == 1 && losses.views.front().surface != nullptr)
        return picture(ledger_drawing(scenario.title, losses, units), scenario.title,
                       options.format);
    return picture(side_by_side_drawing(scenario.title, losses, units), scenario.title,
                   options.format);
}

}  // namespace rainledger
