#pragma once

#include <cstddef>
#include <optional>
#include <span>
#include <string>
#include <vector>

#include "chart/chart_units.hpp"
#include "chart/drawn_steps.hpp"
#include "rainledger/chart/chart.hpp"

// The ledger of a surface, or of the whole site, under one storm, ready to be drawn.
namespace rainledger {

/// What becomes of the supply in a step, each as a mean rate over it in the chart's unit. `stored`
/// is what goes into depression storage; a pond that drains shows in `infiltrated`.
struct StepRates {
    double rain = 0.0;
    double run_on = 0.0;
    double infiltrated = 0.0;
    double initial_loss = 0.0;
    double stored = 0.0;
    double excess = 0.0;
};

struct LossView {
    std::string name;    ///< of the surface or the storm, whichever differs between panels
    std::string method;  ///< of the surface, where that differs between panels
    const Storm* storm = nullptr;
    const Surface* surface = nullptr;  ///< null for the whole site
    std::span<const LedgerRow> rows;
    Accounts total;
    std::span<const PondedInterval> ponding;
    std::optional<double> coefficient;  ///< volumetric runoff coefficient
};

/// The views that a chart of losses is asked for: one for a ledger, several for panels; and what
/// they are all about, for the line below the title.
struct ChosenLosses {
    std::vector<LossView> views;
    std::string about;
    bool same_storm = false;  ///< all under one
    std::string what;         ///< what there are several of: "surfaces", "storms"
};
[[nodiscard]] ChosenLosses chosen_losses(const Scenario& scenario,
                                         std::span<const SiteLedger> ledgers,
                                         const ChartChoice& choice);

[[nodiscard]] std::vector<StepRates> step_rates(const LossView& view, const ChartUnits& units);

/// What makes a step heavy: its supply, or its infiltration where a pond drains.
[[nodiscard]] std::vector<double> supply_weight(std::span<const StepRates> rates);

/// The steps as drawn, the heaviest by that weight.
[[nodiscard]] std::vector<DrawnStep> drawn_steps(const LossView& view,
                                                 std::span<const StepRates> rates,
                                                 std::size_t most);

/// "excess 24.1 mm, coefficient 0.55", the coefficient named as given; "no rain".
[[nodiscard]] std::string excess_words(const LossView& view, std::string_view coefficient,
                                       const ChartUnits& units);

/// "lawn, Horton by infiltrated depth; excess 24.1 mm, volumetric runoff coefficient 0.55" in at
/// most so many columns: long names are cut, the figures never.
[[nodiscard]] std::string ledger_words(const ChosenLosses& losses, const ChartUnits& units,
                                       std::size_t most);

/// The way a surface loses its rain: "Horton by elapsed time", "curve number 89".
[[nodiscard]] std::string loss_method(const Losses& losses);

}  // namespace rainledger
