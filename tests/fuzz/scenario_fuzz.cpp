#include <cmath>
#include <cstddef>
#include <cstdint>
#include <cstdlib>
#include <string>

#include "rainledger/ledger/ledger.hpp"
#include "rainledger/scenario/scenario.hpp"

// Any bytes are either a scenario that marches to a ledger that closes, or at least one error.
extern "C" int LLVMFuzzerTestOneInput(const std::uint8_t* data, std::size_t size);

extern "C" int LLVMFuzzerTestOneInput(const std::uint8_t* data, std::size_t size) {
    rainledger::Diagnostics diagnostics;
    const auto scenario = rainledger::read_scenario_text(
        "/nowhere/fuzz.yaml", std::string(data, data + size), diagnostics);
    if (scenario.has_value() == diagnostics.has_errors()) std::abort();
    for (const rainledger::Diagnostic& diagnostic : diagnostics.list())
        if (rainledger::render(diagnostic).empty()) std::abort();
    if (!scenario) return 0;
    for (const rainledger::Storm& storm : scenario->storms) {
        if (storm.rain.steps() > 2000) continue;
        const auto ledger = rainledger::keep_ledger(scenario->site, storm.rain);
        if (!ledger.unmatched.empty()) continue;
        for (const rainledger::SurfaceLedger& surface : ledger.surfaces) {
            const double supply = surface.total.rain_mm + surface.total.run_on_mm;
            if (!(surface.closure_mm <= 1e-9 * std::fmax(1.0, supply))) std::abort();
        }
    }
    return 0;
}
