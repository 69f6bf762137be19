#pragma once

#include <cstdint>
#include <vector>

#include "rainledger/rain/gauge_record.hpp"

// The rain that a record shows before an instant.
namespace rainledger {

/// Sums a record's rain once, for any number of questions.
class RainBefore {
public:
    explicit RainBefore(const GaugeRecord& record);

    /// Rain from `from_ms` to `to_ms`: tips behind the former up to the latter, and of interval
    /// data the share of a step that lies between.
    [[nodiscard]] double between_mm(std::int64_t from_ms, std::int64_t to_ms) const {
        return up_to_mm(to_ms) - up_to_mm(from_ms);
    }

private:
    [[nodiscard]] double up_to_mm(std::int64_t ms) const;
    [[nodiscard]] double up_to_mm(const TipLog& log, std::int64_t ms) const;
    [[nodiscard]] double up_to_mm(const Hyetograph& rain, std::int64_t ms) const;

    const GaugeRecord& record_;
    std::vector<double> sum_mm_;  // before each tip or step, and in all; none where each is one tip
};

}  // namespace rainledger
