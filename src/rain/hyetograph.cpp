#include "rainledger/rain/hyetograph.hpp"
