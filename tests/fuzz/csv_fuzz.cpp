#include <cstddef>
#include <cstdint>
#include <cstdlib>
#include <string>

#include "rainledger/rain/hyetograph_csv.hpp"

// Any bytes are either a hyetograph that keeps its rules or at least one error.
namespace {

using rainledger::CsvLayout;

/// The first byte picks what the scenario says about the file.
CsvLayout layout_of(std::uint8_t choice) {
    CsvLayout layout;
    if ((choice & 1U) != 0) layout.gaps_are_dry = true;
    if ((choice & 2U) != 0) layout.every_h = 5.0 / 60.0;
    if ((choice & 4U) != 0) layout.stamp = rainledger::StampMeaning::end;
    if ((choice & 8U) != 0) layout.missing = "-999";
    return layout;
}

}  // namespace

extern "C" int LLVMFuzzerTestOneInput(const std::uint8_t* data, std::size_t size);

extern "C" int LLVMFuzzerTestOneInput(const std::uint8_t* data, std::size_t size) {
    if (size == 0) return 0;
    rainledger::Diagnostics diagnostics;
    const auto rain = rainledger::read_hyetograph_csv(
        "fuzz.csv", std::string(data + 1, data + size), layout_of(data[0]), diagnostics);
    if (rain.has_value() == diagnostics.has_errors()) std::abort();
    for (const rainledger::Diagnostic& diagnostic : diagnostics.list())
        if (rainledger::render(diagnostic).empty()) std::abort();
    if (!rain) return 0;
    if (rain->steps() == 0 || rain->edges_h.size() != rain->steps() + 1) std::abort();
    for (std::size_t i = 0; i < rain->steps(); ++i)
        if (!(rain->duration_h[i] > 0.0) || !(rain->depth_mm[i] >= 0.0)) std::abort();
    return 0;
}
