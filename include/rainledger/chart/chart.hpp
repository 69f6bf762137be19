#pragma once

#include <cstddef>
#include <optional>
#include <span>
#include <string>
#include <string_view>

#include "rainledger/ledger/ledger.hpp"
#include "rainledger/report/summary.hpp"
#include "rainledger/scenario/scenario.hpp"

// Pictures of storms and ledgers, drawn by gnuplot. Titles and names are data: nothing in them is
// ever run or read as markup. The text format is drawn without gnuplot. Of a storm of very many
// steps a picture shows, in each strip of time about two pixels wide, the step with the most water.
namespace rainledger {

enum class ChartFormat {
    svg,
    png,
    pdf,
    text,  ///< for a terminal: UTF-8, 100 columns at most
};

/// The format that a file name asks for by its ending (.svg, .png, .pdf, .txt; whatever the case),
/// "-" for text on standard output; nothing for another.
[[nodiscard]] std::optional<ChartFormat> chart_format(std::string_view path);

struct ChartOptions {
    ChartFormat format = ChartFormat::svg;
    DisplayUnits units = DisplayUnits::metric;
};

/// A picture as the bytes of its file, or why there is none.
struct Chart {
    std::optional<std::string> bytes;
    std::string problem;  ///< empty when there are bytes
    std::string hint;
    bool too_many = false;  ///< more was asked for than a chart holds; else gnuplot lacks or failed
};

/// The hyetographs of a scenario's storms (their own steps): intensity by time, with the cumulative
/// depth; several storms as panels of one scale, at most twelve.
[[nodiscard]] Chart hyetograph_chart(const Scenario& scenario, const ChartOptions& options);

/// Which part of the results a chart of losses shows.
struct ChartChoice {
    std::optional<std::size_t> storm;    ///< index in Scenario::storms
    std::optional<std::size_t> surface;  ///< index in Site::surfaces
};

/// The losses of a scenario; `ledgers` holds one ledger per storm, in its order. One surface under
/// one storm (chosen, or the only ones) gives its ledger: rain from the top, capacity and
/// infiltration, excess shaded, ponded intervals marked, cumulative accounts below. Otherwise
/// panels side by side on one scale, at most twelve: the surfaces under one storm; one surface
/// under every storm; or, with several of both and nothing chosen, the whole site under every
/// storm.
[[nodiscard]] Chart losses_chart(const Scenario& scenario, std::span<const SiteLedger> ledgers,
                                 const ChartChoice& choice, const ChartOptions& options);

}  // namespace rainledger
