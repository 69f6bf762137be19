#include "rainledger/chart/fit_chart.hpp"

#include <utility>

#include "chart/finished_svg.hpp"
#include "chart/fit_drawing.hpp"
#include "chart/gnuplot.hpp"
#include "chart/text_fit.hpp"

namespace rainledger {

Chart fit_chart(const ShownFit& shown, const ChartOptions& options) {
    constexpr int kMostTicks = 9;
    const ChartUnits units(options.units);
    const FitView view = fit_view(shown, units, kMostTicks);
    if (options.format == ChartFormat::text) return {text_fit(shown.title, view, units), {}, {}};
    Chart chart = run_gnuplot(fit_drawing(shown.title, view, units).script(options.format));
    if (chart.bytes && options.format == ChartFormat::svg)
        chart.bytes = finished_svg(*std::move(chart.bytes), shown.title);
    return chart;
}

}  // namespace rainledger
