#include "published/storm_books.hpp"

#include <array>
#include <stdexcept>
#include <string>

#include "rainledger/scenario/scenario.hpp"

namespace rainledger::published {
namespace {

using enum Dimension;

// Far below any printed digit, far above a rounding: an excess smaller than this is none.
constexpr double kNoExcessMm = 1.0e-6;

double step_h(const StormBooks& books, std::size_t step) {
    return books.end_h[step] - books.start_h[step];
}

double sum_to(const StormBooks& books, std::size_t step, double Accounts::*account) {
    double sum = 0.0;
    for (std::size_t i = 0; i <= step; ++i)
        sum += books.rows[i].accounts.*account;
    return sum;
}

double rain(const StormBooks& books, std::size_t step) {
    return books.rows[step].accounts.rain_mm;
}

double cumulative_rain(const StormBooks& books, std::size_t step) {
    return sum_to(books, step, &Accounts::rain_mm);
}

double rain_rate(const StormBooks& books, std::size_t step) {
    return rain(books, step) / step_h(books, step);
}

double infiltrated(const StormBooks& books, std::size_t step) {
    return books.rows[step].accounts.infiltrated_mm;
}

double infiltration_rate(const StormBooks& books, std::size_t step) {
    return infiltrated(books, step) / step_h(books, step);
}

double cumulative_infiltrated(const StormBooks& books, std::size_t step) {
    return sum_to(books, step, &Accounts::infiltrated_mm);
}

double capacity(const StormBooks& books, std::size_t step) {
    return books.rows[step].capacity_mm_per_h;
}

double excess(const StormBooks& books, std::size_t step) {
    return books.rows[step].accounts.excess_mm;
}

double cumulative_excess(const StormBooks& books, std::size_t step) {
    return sum_to(books, step, &Accounts::excess_mm);
}

double steps_with_excess(const StormBooks& books, std::size_t /*step*/) {
    double count = 0.0;
    for (const LedgerRow& row : books.rows)
        if (row.accounts.excess_mm > kNoExcessMm) count += 1.0;
    return count;
}

double total_rain(const StormBooks& books, std::size_t /*step*/) {
    return books.total.rain_mm;
}

double total_infiltrated(const StormBooks& books, std::size_t /*step*/) {
    return books.total.infiltrated_mm;
}

double total_excess(const StormBooks& books, std::size_t /*step*/) {
    return books.total.excess_mm;
}

double excess_volume(const StormBooks& books, std::size_t /*step*/) {
    return books.excess_volume_m3;
}

const PondedInterval& only_pond(const StormBooks& books) {
    if (books.ponding.size() != 1)
        throw std::runtime_error(std::to_string(books.ponding.size()) +
                                 " ponded intervals where one is expected");
    return books.ponding.front();
}

double ponding_time(const StormBooks& books, std::size_t /*step*/) {
    return only_pond(books).start_h - books.start_h.front();
}

double ponding_end(const StormBooks& books, std::size_t /*step*/) {
    const auto end = only_pond(books).end_h;
    if (!end) throw std::runtime_error("still ponded at the end");
    return *end - books.start_h.front();
}

double runoff_start(const StormBooks& books, std::size_t /*step*/) {
    if (!books.runoff_start_h) throw std::runtime_error("no runoff");
    return *books.runoff_start_h - books.start_h.front();
}

double phi_index(const StormBooks& books, std::size_t /*step*/) {
    if (!books.phi_index_mm_per_h) throw std::runtime_error("no phi index");
    return *books.phi_index_mm_per_h;
}

constexpr std::array kQuantities{
    StormQuantity{"rain", depth, true, rain},
    StormQuantity{"cumulative_rain", depth, true, cumulative_rain},
    StormQuantity{"rain_rate", rate, true, rain_rate},
    StormQuantity{"infiltrated", depth, true, infiltrated},
    StormQuantity{"infiltration_rate", rate, true, infiltration_rate},
    StormQuantity{"cumulative_infiltrated", depth, true, cumulative_infiltrated},
    StormQuantity{"capacity", rate, true, capacity},
    StormQuantity{"excess", depth, true, excess},
    StormQuantity{"cumulative_excess", depth, true, cumulative_excess},
    StormQuantity{"steps_with_excess", {}, false, steps_with_excess},
    StormQuantity{"total_rain", depth, false, total_rain},
    StormQuantity{"total_infiltrated", depth, false, total_infiltrated},
    StormQuantity{"total_excess", depth, false, total_excess},
    StormQuantity{"excess_volume", volume, false, excess_volume},
    StormQuantity{"ponding_time", time, false, ponding_time},
    StormQuantity{"ponding_end", time, false, ponding_end},
    StormQuantity{"runoff_start", time, false, runoff_start},
    StormQuantity{"phi_index", rate, false, phi_index},
};

Scenario read_one_storm(const std::string& text) {
    Diagnostics diagnostics;
    auto scenario = read_scenario_text("published.yaml", text, diagnostics);
    if (!scenario) {
        std::string problems;
        for (const Diagnostic& diagnostic : diagnostics.list())
            problems += render(diagnostic);
        throw std::runtime_error("the scenario is refused:\n" + problems);
    }
    if (scenario->storms.size() != 1 || scenario->site.surfaces.size() != 1)
        throw std::runtime_error("a check takes one storm over one surface");
    return *std::move(scenario);
}

}  // namespace

const StormQuantity& find_storm_quantity(std::string_view name) {
    for (const StormQuantity& quantity : kQuantities)
        if (quantity.name == name) return quantity;
    throw std::runtime_error("unknown quantity '" + std::string(name) + "'");
}

StormBooks library_books(const StoredStorm& storm) {
    const Scenario scenario = read_one_storm(storm.scenario);
    const Hyetograph& rain = scenario.storms.front().rain;
    const SiteLedger ledger = keep_ledger(scenario.site, rain);
    if (!ledger.unmatched.empty()) throw std::runtime_error("the phi index is not matched");
    const SurfaceLedger& surface = ledger.surfaces.front();
    StormBooks books;
    books.start_h.assign(rain.edges_h.begin(), rain.edges_h.end() - 1);
    books.end_h.assign(rain.edges_h.begin() + 1, rain.edges_h.end());
    books.rows = surface.rows;
    books.total = surface.total;
    books.ponding = surface.ponding;
    books.runoff_start_h = surface.runoff_start_h;
    books.phi_index_mm_per_h = surface.phi_index_mm_per_h;
    books.excess_volume_m3 = surface.figures.excess_volume_m3;
    return books;
}

}  // namespace rainledger::published
