#include <algorithm>
#include <cstddef>
#include <cstdint>
#include <cstdlib>
#include <new>
#include <string>
#include <utility>

#include <malloc.h>

#include "rain/record_helpers.hpp"
#include "rain/synthetic_logger.hpp"
#include "rainledger/rain/rain_events.hpp"

// Every allocation of this program is counted, so that the peak is the same on every machine.
namespace {

std::size_t in_use = 0;
std::size_t peak = 0;

}  // namespace

void* operator new(std::size_t size) {
    void* const place = std::malloc(size);
    if (place == nullptr) throw std::bad_alloc();
    in_use += malloc_usable_size(place);
    peak = std::max(peak, in_use);
    return place;
}

void* operator new(std::size_t size, const std::nothrow_t& /*never throws*/) noexcept {
    try {
        return operator new(size);
    } catch (const std::bad_alloc&) {
        return nullptr;
    }
}

void operator delete(void* place) noexcept {
    if (place != nullptr) in_use -= malloc_usable_size(place);
    std::free(place);
}

void operator delete(void* place, std::size_t /*size*/) noexcept {
    operator delete(place);
}

void operator delete(void* place, const std::nothrow_t& /*never throws*/) noexcept {
    operator delete(place);
}

namespace rainledger {
namespace {

constexpr std::size_t kTips = 1'000'000;

/// A million tips, of which one is out of order where asked.
std::string million_tips(bool with_counts, bool out_of_order) {
    std::string text = with_counts ? "time,tips\n" : "time\n";
    text.reserve(25 * kTips);
    SeededNumbers numbers(3);
    std::int64_t second = 1'924'992'000;
    for (std::size_t i = 0; i < kTips; ++i) {
        second += 1 + static_cast<std::int64_t>(numbers.below(200));
        text += stamp_of(out_of_order && i == kTips / 2 ? second - 5000 : second);
        if (with_counts) text += i % 3 == 0 ? ",2" : ",1";
        text += '\n';
    }
    return text;
}

/// Bytes beyond what was in use that `work` needs at its peak.
template <typename Work>
std::size_t extra_peak(const Work& work) {
    const std::size_t before = in_use;
    peak = in_use;
    work();
    return peak - before;
}

}  // namespace

TEST_CASE("a million tips are read and parted into events within 40 bytes per tip") {
    const bool with_counts = GENERATE(false, true);
    const bool out_of_order = GENERATE(false, true);
    CAPTURE(with_counts, out_of_order);
    std::string text = million_tips(with_counts, out_of_order);
    std::optional<GaugeRecord> record;
    const std::size_t reading = extra_peak([&] {
        Diagnostics diagnostics;
        record = read_gauge_record("logger.csv", std::move(text), tip_layout(), diagnostics);
    });
    REQUIRE(record.has_value());
    REQUIRE(tips_of(*record).unix_ms.size() == kTips);
    CHECK(reading <= 40 * kTips);
    // With the last, a dry spell with rain in it could begin behind every tip.
    for (const double threshold_mm : {0.0, 7.0, 1000.0}) {
        CAPTURE(threshold_mm);
        RecordEvents found;
        const std::size_t finding = extra_peak([&] {
            found = find_events(*record, {1.0, threshold_mm}, {});
        });
        CHECK(finding <= 40 * kTips);
    }
}

}  // namespace rainledger
