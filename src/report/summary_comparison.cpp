#include <fmt/core.h>

#include "rainledger/base/number.hpp"
#include "report/summary_parts.hpp"
#include "report/text_table.hpp"

namespace rainledger {
namespace {

constexpr std::size_t kMostForPlaces = 12;  // storms; with more the whole site stands alone

void add_place(TextTable& table, const Scenario& scenario, std::span<const SiteLedger> ledgers,
               std::size_t place, const Display& display) {
    for (std::size_t i = 0; i < ledgers.size(); ++i) {
        const JointPlace joint = joint_places(ledgers[i])[place];
        const ExcessFigures& figures = joint.ledger->figures;
        const auto& coefficient = figures.volumetric_runoff_coefficient;
        std::vector<std::string> cells{i == 0 ? joint.label : std::string(),
                                       printable(scenario.storms[i].name),
                                       display.depth(joint.ledger->total.rain_mm),
                                       display.depth(joint.ledger->total.excess_mm),
                                       display.volume(figures.excess_volume_m3),
                                       coefficient ? fixed(*coefficient, 2) : "-"};
        for (const double flow : figures.worst_flow_l_per_s)
            cells.push_back(display.flow(flow));
        table.row(std::move(cells));
    }
}

}  // namespace

std::string comparison_part(const Scenario& scenario, std::span<const SiteLedger> ledgers,
                            const Display& display) {
    TextTable table;
    table.column("place", Align::left);
    table.column("storm", Align::left);
    table.column(fmt::format("rain|{}", display.depth_unit()), Align::point);
    table.column(fmt::format("excess|{}", display.depth_unit()), Align::point);
    table.column(fmt::format("volume|{}", display.volume_unit()), Align::point);
    table.column("runoff|coeff.", Align::point);
    for (const int minutes : kWindowsMinutes)
        table.column(fmt::format("{} min|{}", minutes, display.flow_unit()), Align::point);
    const std::size_t places = joint_places(ledgers.front()).size();
    const std::size_t first = ledgers.size() > kMostForPlaces ? places - 1 : 0;
    for (std::size_t place = first; place < places; ++place) {
        if (place > first) table.rule();
        add_place(table, scenario, ledgers, place, display);
    }
    return "The storms side by side; flows are the excess averaged over the worst minutes\n" +
           table.text();
}

}  // namespace rainledger
